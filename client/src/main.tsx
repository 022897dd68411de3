import '@fontsource/space-grotesk/latin-400.css';
import '@fontsource/space-grotesk/latin-500.css';
import '@fontsource/space-grotesk/latin-700.css';
import '#client/styles/main.css';

import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';

import { App } from '#client/app/app.tsx';

const container = document.getElementById('root');
if (container === null) {
  throw new Error('The page has no #root to render into.');
}
// Pages bring their own title, and the browser shows the first one it finds.
document.querySelector('head > title')?.remove();
createRoot(container).render(
  <StrictMode>
    <App />
  </StrictMode>,
);

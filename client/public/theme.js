// Runs before the first paint so that a dark page never flashes light. A file of its own, not an
// inline script, because the content security policy allows none.
(function () {
  var stored = null;
  try {
    stored = localStorage.getItem('holdfast.theme');
  } catch {
    // Storage may be blocked; the system's preference then decides.
  }
  var isDark =
    stored === 'dark' || (stored !== 'light' && matchMedia('(prefers-color-scheme: dark)').matches);
  document.documentElement.classList.toggle('dark', isDark);
})();

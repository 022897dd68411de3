import { render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import type { JSX } from 'react';
import { describe, expect, it, vi } from 'vitest';

import { ToastProvider, useToast, type ToastRequest } from '#client/components/toast.tsx';

function Trigger({ request }: { request: ToastRequest }): JSX.Element {
  const show = useToast();
  return (
    <button type="button" onClick={() => show(request)}>
      go
    </button>
  );
}

async function showToast(request: ToastRequest): Promise<ReturnType<typeof userEvent.setup>> {
  const user = userEvent.setup();
  render(
    <ToastProvider>
      <Trigger request={request} />
    </ToastProvider>,
  );
  await user.click(screen.getByText('go'));
  return user;
}

describe('toast', () => {
  it('says it where screen readers listen, and closes', async () => {
    const user = await showToast({ message: 'Saved' });
    expect(screen.getByRole('status')).toHaveTextContent('Saved');
    await user.click(screen.getByRole('button', { name: 'Close this message' }));
    expect(screen.queryByText('Saved')).not.toBeInTheDocument();
  });

  it('offers the way back once', async () => {
    const onAction = vi.fn();
    const user = await showToast({ message: 'Deleted', action: { label: 'Undo', onAction } });
    await user.click(screen.getByRole('button', { name: 'Undo' }));
    expect(onAction).toHaveBeenCalledTimes(1);
    expect(screen.queryByText('Deleted')).not.toBeInTheDocument();
  });

  it('names a failure as one', async () => {
    await showToast({ message: 'No copy was made.', tone: 'failure' });
    expect(screen.getByRole('status')).toHaveTextContent('Failed: No copy was made.');
  });
});

/** Puts a text on the clipboard, also where the page is not served securely. */
export async function copyText(text: string): Promise<void> {
  if (window.isSecureContext) {
    await navigator.clipboard.writeText(text);
    return;
  }
  const holder = document.createElement('textarea');
  holder.value = text;
  holder.style.position = 'fixed';
  holder.style.opacity = '0';
  const focused = document.activeElement;
  (focused?.closest('[role="dialog"]') ?? document.body).append(holder);
  holder.select();
  // The only way on plain http; marked as deprecated, yet every browser has it.
  const isCopied = document.execCommand('copy');
  holder.remove();
  if (focused instanceof HTMLElement) {
    focused.focus();
  }
  if (!isCopied) {
    throw new Error('The browser refused to copy.');
  }
}

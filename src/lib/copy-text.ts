/** Puts a text on the clipboard; false where the browser does not let it. */
export async function copyText(text: string): Promise<boolean> {
  try {
    // missing where the page came over plain HTTP
    await navigator.clipboard.writeText(text);
    return true;
  } catch {
    return copyBySelection(text);
  }
}

function copyBySelection(text: string): boolean {
  const focused = document.activeElement;
  const field = document.createElement('textarea');
  field.value = text;
  field.style.position = 'fixed';
  field.style.opacity = '0';
  // within an open dialog, which keeps the focus to itself
  (document.querySelector('[role="dialog"]') ?? document.body).append(field);
  field.select();
  try {
    return document.execCommand('copy');
  } catch {
    return false;
  } finally {
    field.remove();
    if (focused instanceof HTMLElement) focused.focus();
  }
}

/**
 * Puts text on the clipboard and tells whether that worked. The clipboard interface is missing on
 * plain http from another machine, where the older command still serves.
 */
export async function copyText(text: string): Promise<boolean> {
  try {
    await navigator.clipboard.writeText(text);
    return true;
  } catch {
    return copyBySelection(text);
  }
}

function copyBySelection(text: string): boolean {
  const area = document.createElement('textarea');
  area.value = text;
  area.setAttribute('readonly', '');
  area.style.position = 'fixed';
  area.style.opacity = '0';
  const holder = document.activeElement;
  document.body.append(area);
  area.select();
  const done = document.execCommand('copy');
  area.remove();
  if (holder instanceof HTMLElement) holder.focus();
  return done;
}

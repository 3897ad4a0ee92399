/** Gives the focus to an element that the edit just made is about to show, so that whoever types does not lose their place. */
export function focusNext(id: string): void {
  requestAnimationFrame(() => document.getElementById(id)?.focus());
}

/** Moves the focus to the first marked field inside `place`, once it is drawn. */
export function focusFirstFault(place: HTMLElement | null): void {
  requestAnimationFrame(() => place?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus());
}

/** A code that none of these has yet: `new-1`, `new-2`. */
export function freshCode(taken: readonly { readonly code: string }[]): string {
  const codes = new Set(taken.map(({ code }) => code));
  let number = taken.length + 1;
  while (codes.has(`new-${number}`)) number += 1;
  return `new-${number}`;
}

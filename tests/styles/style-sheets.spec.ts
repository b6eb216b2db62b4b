import { readdirSync, readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { describe, expect, it } from 'vitest';

const source = fileURLToPath(new URL('../../frontend/src/', import.meta.url));
const sheets = Object.fromEntries(
  readdirSync(source, { recursive: true, encoding: 'utf8' })
    .filter((path) => path.endsWith('.css'))
    .map((path) => [path, readFileSync(source + path, 'utf8')]),
);

interface Selector {
  readonly owner: string;
  readonly text: string;
}

/** `features/lots/…` belongs to lots; everything outside the features is shared by all. */
function ownerOf(path: string): string {
  return /features\/([^/]+)\//.exec(path)?.[1] ?? 'shared';
}

const selectors: Selector[] = Object.entries(sheets).flatMap(([path, text]) =>
  [...text.replaceAll(/\/\*[^]*?\*\//g, '').matchAll(/([^{}]+)\{/g)]
    .map((found) => (found[1] ?? '').trim())
    .filter((head) => head !== '' && !head.startsWith('@'))
    .flatMap((head) => head.split(/,(?![^(]*\))/).map((one) => ({ owner: ownerOf(path), text: one.trim() }))),
);

/** The lot sheet shows the visit's own acts in its title block, and sets them closer there. */
const embedded = new Set(['visit-acts of visits in lots', 'side-part of visits in lots']);

/** Style sheets stay on the page after their feature was left: a bare class of one must mean nothing to another. */
describe('style sheets', () => {
  it('are read at all', () => {
    expect(selectors.length).toBeGreaterThan(400);
  });

  it('a class that a feature dresses everywhere is used by no other feature and by nothing shared', () => {
    const bare = selectors.flatMap(({ owner, text }) => {
      const name = /^\.([\w-]+)(?::[\w-]+)*$/.exec(text)?.[1];
      return owner === 'shared' || name === undefined ? [] : [{ owner, name }];
    });
    const isOf = (name: string) => new RegExp(`\\.${name}(?![\\w-])`);
    const clashes = bare.flatMap(({ owner, name }) =>
      selectors
        .filter((other) => other.owner !== owner && isOf(name).test(other.text))
        .filter((other) => !embedded.has(`${name} of ${owner} in ${other.owner}`))
        .map((other) => `.${name} of ${owner} meets "${other.text}" of ${other.owner}`),
    );
    expect([...new Set(clashes)]).toEqual([]);
  });
});

/** A form-encoded body as the tree that its bracketed names describe; arrays are trees with number keys. */
export type FormTree = { [name: string]: string | FormTree };

const emptyTree = (): FormTree => Object.create(null) as FormTree;

function put(tree: FormTree, path: readonly string[], value: string): void {
  const [head, ...rest] = path;
  if (head === undefined) return;
  const name = head === '' ? String(Object.keys(tree).length) : head;
  if (rest.length === 0) {
    tree[name] = value;
    return;
  }
  const found = tree[name];
  const branch = typeof found === 'object' ? found : emptyTree();
  tree[name] = branch;
  put(branch, rest, value);
}

/** Reads `a=1&b[c]=2&d[0][e]=3` and `d[]=4`. */
export function parseForm(text: string): FormTree {
  const tree = emptyTree();
  for (const [name, value] of new URLSearchParams(text)) {
    const opening = name.indexOf('[');
    if (opening < 1) {
      put(tree, [name], value);
      continue;
    }
    const parts = [...name.slice(opening).matchAll(/\[([^[\]]*)\]/g)].map((match) => match[1] ?? '');
    put(tree, [name.slice(0, opening), ...parts], value);
  }
  return tree;
}

/** The same text for the same parameters in whatever order they came. */
export function canonicalText(tree: FormTree): string {
  const entries = Object.keys(tree)
    .sort()
    .map((name) => {
      const value = tree[name] ?? '';
      return `${JSON.stringify(name)}:${typeof value === 'string' ? JSON.stringify(value) : canonicalText(value)}`;
    });
  return `{${entries.join(',')}}`;
}

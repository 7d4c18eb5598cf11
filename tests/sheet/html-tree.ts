import type { DefaultTreeAdapterMap } from 'parse5';

type Node = DefaultTreeAdapterMap['node'];
export type Element = DefaultTreeAdapterMap['element'];

/** The elements of a tree in its order, those of one name or all. */
export function elements(node: Node, name: string | null = null): Element[] {
  if (!('childNodes' in node)) return [];
  return node.childNodes.flatMap((child) => [
    ...('tagName' in child && (name === null || child.tagName === name) ? [child] : []),
    ...elements(child, name),
  ]);
}

/** The text within a node. */
export function textIn(node: Node): string {
  if ('value' in node) return node.value;
  return 'childNodes' in node ? node.childNodes.map(textIn).join('') : '';
}

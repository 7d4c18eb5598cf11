import fc from 'fast-check';
import { expect, test } from 'vitest';
import Yoga from 'yoga-layout';
import * as inkDom from '../../../node_modules/ink/build/dom.js';
import { setTextNodeValue } from '../../../src/screen/terminal/ink-dom.ts';
import { anyRow, ownRow } from './rows-of-any-kind.ts';

interface Tree {
  readonly texts: readonly ReturnType<typeof inkDom.createTextNode>[];
  /** Places and sizes of the box and all its texts. */
  layout(): unknown[];
}

/** A box with one text after another, each in an element of its own. */
function tree(direction: 'row' | 'column', width: number, rows: readonly string[]): Tree {
  const box = inkDom.createNode('ink-box');
  inkDom.setStyle(box, { flexDirection: direction, width });
  box.yogaNode!.setWidth(width);
  box.yogaNode!.setFlexDirection(
    direction === 'column' ? Yoga.FLEX_DIRECTION_COLUMN : Yoga.FLEX_DIRECTION_ROW,
  );
  const elements = rows.map(() => inkDom.createNode('ink-text'));
  const texts = rows.map((row) => inkDom.createTextNode(row));
  for (const [at, element] of elements.entries()) {
    inkDom.setStyle(element, { textWrap: 'truncate' });
    // The reconciler hands over text nodes too, whatever the type says.
    inkDom.appendChildNode(element, texts[at] as unknown as inkDom.DOMElement);
    inkDom.appendChildNode(box, element);
  }
  return {
    texts,
    layout() {
      box.yogaNode!.calculateLayout(undefined, undefined, Yoga.DIRECTION_LTR);
      return [box, ...elements].map(({ yogaNode }) => yogaNode!.getComputedLayout());
    },
  };
}

const row = fc.oneof({ weight: 4, arbitrary: ownRow }, { weight: 1, arbitrary: anyRow });
const change = fc.record({ at: fc.nat(5), text: row });

test('whatever texts change into, the layout that is kept is the one Ink would work out anew', () => {
  fc.assert(
    fc.property(
      fc.constantFrom('column' as const, 'column' as const, 'row' as const),
      fc.integer({ min: 1, max: 80 }),
      fc.array(row, { minLength: 1, maxLength: 6 }),
      fc.array(change, { minLength: 1, maxLength: 5 }),
      (direction, width, rows, changes) => {
        const ours = tree(direction, width, rows);
        const theirs = tree(direction, width, rows);
        expect(ours.layout()).toEqual(theirs.layout());
        for (const { at, text } of changes) {
          setTextNodeValue(ours.texts[at % rows.length]!, text);
          inkDom.setTextNodeValue(theirs.texts[at % rows.length]!, text);
          expect(ours.texts.map(({ nodeValue }) => nodeValue)).toEqual(
            theirs.texts.map(({ nodeValue }) => nodeValue),
          );
          expect(ours.layout()).toEqual(theirs.layout());
        }
      },
    ),
    { numRuns: 300 },
  );
});

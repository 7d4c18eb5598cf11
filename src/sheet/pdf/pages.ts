import type { Paper } from '../../session/session.ts';
import { safe } from '../safe.ts';
import type { Fact } from '../sheet.ts';
import { SheetDocument } from './document.ts';
import { Face } from './face.ts';
import { bold, regular } from './font-files.ts';

/** Points: the papers, what stays white, and the lines above and below the page's own. */
const PAPERS: Readonly<Record<Paper, readonly [number, number]>> = {
  A4: [595.28, 841.89],
  Letter: [612, 792],
};
const SIDE = 42;
const EDGE = 30;
const SMALL = 7.5;
/** From line to line, of the size. */
const LEADING = 1.3;
const GREY = '#333333';
const CAUTION = 'Preliminary sizing for discussion. Local code and a licensed professional decide.';

/** An element of the document's structure, as readers of it are told it. */
export type Element = PDFKit.PDFStructureElement;

/** An entry of the outline that a reader shows beside the pages. */
interface Bookmark {
  /** `top`: where on the page at hand it leads to, points. */
  addItem(title: string, options?: { readonly top: number }): Bookmark;
}

export type Weight = 'regular' | 'bold';

export interface Style {
  readonly size: number;
  readonly weight: Weight;
  readonly colour: string;
}

/** Pages one after the other: where the next line stands, what stands on each of them, and the text put on them. */
export class Pages {
  readonly doc: SheetDocument;
  readonly faces: Readonly<Record<Weight, Face>>;
  readonly left = SIDE;
  readonly width: number;
  /** First line of a page, and where the last one has to end. */
  readonly top: number;
  readonly bottom: number;
  y = 0;
  #bookmark: Bookmark | null = null;
  readonly #running: readonly string[];
  readonly #height: number;

  constructor(title: string, titleBlock: readonly Fact[], date: string | null, paper: Paper) {
    const [width, height] = PAPERS[paper];
    this.doc = new SheetDocument(safe(title), date, [width, height]);
    this.faces = { regular: new Face(regular), bold: new Face(bold) };
    this.doc.registerFont('regular', this.faces.regular.font as never);
    this.doc.registerFont('bold', this.faces.bold.font as never);
    this.width = width - 2 * SIDE;
    this.#height = height;
    const facts = titleBlock.map(([label, value]) => `${label}: ${safe(value)}`).join('; ');
    this.#running = facts === '' ? [] : this.faces.regular.lines(this.#shown(facts), SMALL, this.width);
    this.top = EDGE + this.#running.length * SMALL * LEADING + 10;
    this.bottom = height - EDGE - SMALL * LEADING - 8;
  }

  #shown(text: string): string {
    return this.faces.regular.shown(text);
  }

  /** Height of a line of a style. */
  leading({ size }: Style): number {
    return size * LEADING;
  }

  /** Begins a page. The first tells the title block as text, the others repeat it for the eye alone. */
  turn(first: Element | null = null): void {
    this.doc.addPage();
    const draw = () => {
      for (const [at, text] of this.#running.entries())
        this.#put(text, this.left, EDGE + at * SMALL * LEADING, {
          size: SMALL,
          weight: 'regular',
          colour: GREY,
        });
    };
    if (this.#running.length > 0) {
      if (first === null) this.artifact(draw);
      else this.marked(this.within(first, 'P'), 'P', draw);
      this.artifact(() => this.rule(this.top - 6, 0.5));
    }
    this.y = this.top;
  }

  /** Makes room for so much height: on this page, or the next. True where a page was turned. */
  need(height: number): boolean {
    if (this.y + height <= this.bottom) return false;
    this.turn();
    return true;
  }

  /** A line of text at a place; nothing is broken here. */
  put(text: string, x: number, y: number, style: Style): void {
    if (text !== '') this.#put(this.faces[style.weight].shown(text), x, y, style);
  }

  #put(text: string, x: number, y: number, { size, weight, colour }: Style): void {
    this.doc.font(weight).fontSize(size).fillColor(colour).text(text, x, y, { lineBreak: false });
  }

  rule(y: number, thickness: number, colour = 'black'): void {
    this.doc
      .moveTo(this.left, y)
      .lineTo(this.left + this.width, y)
      .lineWidth(thickness)
      .strokeColor(colour)
      .stroke();
  }

  /** What `draw` draws belongs to an element. */
  marked(element: Element, type: string, draw: () => void): void {
    const content = this.doc.markStructureContent(type);
    element.add(content);
    draw();
    this.doc.endMarkedContent();
  }

  /** What `draw` draws is for the eye alone. */
  artifact(draw: () => void): void {
    this.doc.markContent('Artifact', { type: 'Layout' });
    draw();
    this.doc.endMarkedContent();
  }

  /** An element within another. */
  within(parent: Element, type: string, options: PDFKit.Mixins.StructureElementOptions = {}): Element {
    const element = this.doc.struct(type as never, options);
    parent.add(element);
    return element;
  }

  /** The element that all others stand in. */
  root(): Element {
    const root = this.doc.struct('Document');
    this.doc.addStructure(root);
    return root;
  }

  /** Begins a section here: a bookmark, and a place that links lead to. */
  begin(id: string, title: string): void {
    this.doc.addNamedDestination(id, 'XYZ', null, this.y, null);
    this.#bookmark = (this.doc.outline as unknown as Bookmark).addItem(safe(title));
  }

  /** A bookmark within the section. */
  mark(text: string): void {
    this.#bookmark?.addItem(safe(text), { top: this.y });
  }

  /** A place on the page leads to a section; `link` is the element of the text there. */
  leadTo(
    link: Element,
    id: string,
    [x, y, width, height]: readonly [number, number, number, number],
    says: string,
  ): void {
    this.doc.goTo(x, y, width, height, id, { structParent: link, Contents: new String(safe(says)) } as never);
  }

  /** The lines below, now that the number of pages is known, and the bytes. */
  async finish(): Promise<Uint8Array> {
    const { count } = this.doc.bufferedPageRange();
    const style: Style = { size: SMALL, weight: 'regular', colour: GREY };
    const y = this.#height - EDGE - SMALL * LEADING;
    for (let page = 0; page < count; page += 1) {
      this.doc.switchToPage(page);
      const number = `${page + 1} of ${count}`;
      const right = this.left + this.width - this.faces.regular.width(number, SMALL);
      this.artifact(() => {
        this.rule(y - 4, 0.5);
        this.put(CAUTION, this.left, y, style);
        this.put(number, right, y, style);
      });
    }
    const pieces: Uint8Array[] = [];
    const done = new Promise<void>((resolve, reject) => {
      this.doc.on('data', (piece: Uint8Array) => pieces.push(piece));
      this.doc.on('end', resolve);
      this.doc.on('error', reject);
    });
    this.doc.end();
    await done;
    return new Uint8Array(Buffer.concat(pieces));
  }
}

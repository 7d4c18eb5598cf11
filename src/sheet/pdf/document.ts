import PDFDocument from 'pdfkit';
import { escapeHtml } from '../write/escape-html.ts';

/** What pdfkit keeps to itself and this has to reach: the description of the document in XMP. */
interface Within {
  info: Record<string, unknown>;
  appendXML(xml: string): void;
  endSubset(): void;
}

/** The day of a date written as in ISO 8601; null for any other. */
function dayOf(date: string | null): Date | null {
  if (date === null || !/^\d{4}-\d{2}-\d{2}$/.test(date)) return null;
  const day = new Date(`${date}T00:00:00Z`);
  // The 31st of February is read as a day of March.
  return Number.isNaN(day.getTime()) || !day.toISOString().startsWith(date) ? null : day;
}

/** pdfkit's identifier of a file is made from a date, which it would take from the clock. */
const NO_DAY = new Date(0);

/** A tagged PDF that says no more of its time than its own date: no clock is in its bytes. */
export class SheetDocument extends PDFDocument {
  readonly #title: string;
  readonly #day: Date | null;
  #operators: string[] = [];

  /** `size`: of the paper, points. */
  constructor(title: string, date: string | null, size: readonly [number, number]) {
    const day = dayOf(date);
    super({
      size: [...size],
      margin: 0,
      autoFirstPage: false,
      bufferPages: true,
      font: '',
      pdfVersion: '1.7',
      tagged: true,
      displayTitle: true,
      lang: 'en',
      subset: 'PDF/UA' as never,
      info: { Title: title, Producer: 'thrice', Creator: 'thrice', CreationDate: day ?? NO_DAY },
    });
    this.#title = title;
    this.#day = day;
    const within = this as unknown as Within;
    if (day === null) delete within.info.CreationDate;
    // Tagged as PDF/UA asks, but it does not claim the standard: no validator has held the file to it.
    within.endSubset = () => undefined;
  }

  /** What is drawn on the page at hand: written to it in one piece, of which pdfkit would keep thousands a page. */
  override addContent(operators: string): this {
    this.#operators.push(operators);
    return this;
  }

  #settle(): void {
    if (this.#operators.length > 0) this.page.write(this.#operators.join('\n'));
    this.#operators = [];
  }

  override addPage(options?: PDFKit.PDFDocumentOptions): this {
    this.#settle();
    super.addPage(options);
    return this;
  }

  override switchToPage(page: number): PDFKit.PDFPage {
    this.#settle();
    return super.switchToPage(page);
  }

  override end(): void {
    this.#settle();
    super.end();
  }

  /** The layout is this program's own: pdfkit, which would measure every text twice, need not. */
  override widthOfString(): number {
    return 0;
  }

  /** In place of pdfkit's own, which asks for a date and writes the title as it is. */
  _addInfo(): void {
    const { appendXML } = this as unknown as Within;
    const append = appendXML.bind(this);
    append(
      '<rdf:Description rdf:about="" xmlns:xmp="http://ns.adobe.com/xap/1.0/" xmlns:dc="http://purl.org/dc/elements/1.1/" xmlns:pdf="http://ns.adobe.com/pdf/1.3/">',
    );
    append('<xmp:CreatorTool>thrice</xmp:CreatorTool><pdf:Producer>thrice</pdf:Producer>');
    if (this.#day !== null) append(`<xmp:CreateDate>${this.#day.toISOString()}</xmp:CreateDate>`);
    append(
      `<dc:title><rdf:Alt><rdf:li xml:lang="x-default">${escapeHtml(this.#title)}</rdf:li></rdf:Alt></dc:title>`,
    );
    append('</rdf:Description>');
  }
}

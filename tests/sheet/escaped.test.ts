import { micromark } from 'micromark';
import { gfm, gfmHtml } from 'micromark-extension-gfm';
import { parse, parseFragment } from 'parse5';
import { describe, expect, test } from 'vitest';
import { elements, textIn } from './html-tree.ts';
import { bytesOf, jobWith, textOf } from './support.ts';

/** Texts that would do something where they are not escaped; each begins a word of its own. */
const HOSTILE = [
  '<script>alert(1)</script>',
  '"><img src=x onerror=alert(1)>',
  "' onmouseover='alert(1)",
  '</style><style>*{display:none}</style>',
  '&lt;b&gt; &amp; &#60;',
  '[link](http://example.invalid) ![x](y)',
  '**bold** _under_ ~~gone~~ `code` ``` fence',
  'a | b || c',
  'www.example.invalid http://example.invalid me@example.invalid',
  '# head',
  '- item',
  '1. item',
  '> quote',
  '=HYPERLINK("http://example.invalid")',
  '\\*literal\\* \\',
  '<!-- comment --> <![CDATA[x]]> ]]>',
  '$x$ :smile: ^[note]',
];

/** A session whose every free text is hostile. */
function job(text: string) {
  const design = {
    spans: ['12 ft'],
    area: { live: '40 psf' },
    stock: { product: 'dimension lumber', species: 'Hem-Fir', grade: 'No.2' },
    section: { width: '1.5 in', depth: '9.25 in' },
  };
  return jobWith(
    [
      {
        name: text.slice(0, 60),
        note: text,
        stock: {
          product: 'custom',
          grade: text.slice(0, 60),
          values: {
            Fb: '2000 psi',
            Fv: '200 psi',
            Fcperp: '500 psi',
            E: '1500000 psi',
            Emin: '700000 psi',
            G: 0.5,
          },
          valuesFrom: text,
        },
        factors: { CD: { value: 1, reason: text } },
        pins: [{ note: text, design }],
      },
    ],
    {
      title: text,
      sheet: {
        firm: text,
        job: text,
        jobNumber: text,
        by: text,
        checkedBy: text,
        revision: text,
        date: text,
      },
    },
  );
}

const ELEMENTS = new Set(
  'html head meta title style body header h1 h2 h3 h4 h5 nav ul li a main section div p strong dl dt dd table caption thead tbody tr th td figure figcaption svg desc polyline polygon text span'.split(
    ' ',
  ),
);
const ATTRIBUTES = new Set(
  'lang charset name content http-equiv href id class aria-label aria-labelledby role tabindex scope data-check viewBox font-family font-size font-weight points fill stroke stroke-width stroke-dasharray x y text-anchor'.split(
    ' ',
  ),
);

describe.each(HOSTILE)('the text %j', (text) => {
  test('stands in HTML as text alone, wherever the session holds it', async () => {
    const tree = parse(await textOf(job(text), 'html'));
    const all = elements(tree);
    for (const { tagName, attrs } of all) {
      expect(ELEMENTS).toContain(tagName);
      for (const { name, value } of attrs) {
        expect(ATTRIBUTES).toContain(name);
        if (name === 'href') expect(value).toMatch(/^#[a-z0-9-]+$/);
      }
    }
    const body = textIn(all.find(({ tagName }) => tagName === 'main')!);
    // Name, note, source, reason and the note of the pin.
    expect(body.split(text).length - 1).toBeGreaterThanOrEqual(4);
    expect(textIn(all.find(({ tagName }) => tagName === 'title')!)).toContain(text);
  });

  test('stands in Markdown as text alone', async () => {
    const markdown = await textOf(job(text), 'md');
    const html = micromark(markdown, {
      allowDangerousHtml: true,
      extensions: [gfm()],
      htmlExtensions: [gfmHtml()],
    });
    const tree = parseFragment(html);
    const all = elements(tree);
    const allowed = 'h1 h2 h3 h4 p ul li hr a strong table thead tbody tr th td pre code'.split(' ');
    for (const { tagName, attrs } of all) {
      expect(allowed, tagName).toContain(tagName);
      for (const { name, value } of attrs) {
        if (name === 'href') expect(value).toMatch(/^#member-\d+$/);
        else expect(['id', 'align', 'class']).toContain(name);
      }
    }
    const written = textIn(tree).replace(/\s+/g, ' ');
    const wanted = text.replace(/\s+/g, ' ').trim();
    expect(written.split(wanted).length - 1, wanted).toBeGreaterThanOrEqual(4);
  });
});

test.each(HOSTILE.filter((text) => /[<>&]/.test(text)))(
  'the text %j leaves the description of a PDF well formed',
  async (text) => {
    const pdf = Buffer.from(await bytesOf(job(text), 'pdf')).toString('latin1');
    const from = pdf.indexOf('<x:xmpmeta');
    const xml = pdf.slice(from, pdf.indexOf('</x:xmpmeta>', from) + '</x:xmpmeta>'.length);
    const names = [...xml.matchAll(/<(\/?)([A-Za-z][\w:]*)[^<>]*?(\/?)>/g)];
    const open: string[] = [];
    for (const [, closes, name, empty] of names) {
      if (closes === '/') expect(open.pop()).toBe(name);
      else if (empty === '') open.push(name!);
    }
    expect(open).toEqual([]);
    const known =
      /^(x:xmpmeta|rdf:(RDF|Description|Alt|li)|xmp:CreatorTool|pdf:Producer|dc:title|pdfuaid:part)$/;
    for (const [, , name] of names) expect(name).toMatch(known);
    expect(xml).not.toContain(text.includes('<') ? text : '<script');
  },
);

test('no format but PDF holds a character that moves a cursor or turns what is read', async () => {
  // A session file holds none, but a session can come from elsewhere than a file.
  const plain = job('quiet');
  const bad = 'a\u001b[31mb\u202ec\u0007d\ne';
  const members = plain.members.map((each) => ({
    ...each,
    member: { ...each.member, note: bad, name: bad },
  }));
  const session = { ...plain.session, title: bad, members, sheet: { firm: bad } };
  for (const format of ['txt', 'md', 'html'] as const) {
    const text = await textOf({ ...plain, session, members }, format);
    expect(text, format).not.toMatch(/[\u0000-\u0009\u000b-\u001f\u007f-\u009f\u200b-\u200f\u2028-\u202e]/);
    expect(text, format).toContain('1b');
  }
});

import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { readSession, writeSession } from '../../src/session/index.ts';
import { type JobSetting, jobSettings } from '../../src/session/job-settings.ts';
import type { Session } from '../../src/session/session.ts';
import { sessionText } from '../support/session.ts';

function opened(text = sessionText({})): Session {
  const read = readSession(text, 'test.json');
  if (!read.ok) throw new Error(read.fault);
  return read.session;
}
const setting = (key: string): JobSetting => jobSettings().find((each) => each.key === key)!;
function turned(session: Session, key: string, by: 1 | -1 = 1): Session {
  const change = setting(key).turn!(session, by);
  if ('fault' in change) throw new Error(change.fault);
  return change.session;
}
function entered(session: Session, key: string, text: string): Session {
  const change = setting(key).enter!(session, text);
  if ('fault' in change) throw new Error(change.fault);
  return change.session;
}
const written = (session: Session) => JSON.parse(writeSession(session));

describe('what is set for the whole session', () => {
  it('stands in its file where it was stated, and nowhere else', () => {
    let session = opened();
    session = entered(session, 'title', 'Kiosk');
    session = turned(session, 'units');
    session = turned(session, 'combinations');
    session = turned(session, 'best');
    session = entered(session, 'stock.species', 'southern');
    session = entered(session, 'sheet.by', 'A.');
    session = turned(session, 'sheet.paper');
    expect(written(session)).toMatchObject({
      title: 'Kiosk',
      units: 'si',
      combinations: 'ASCE 7-22',
      best: 'depth',
      stock: { product: 'dimension lumber', species: 'Southern Pine', grade: 'No.2' },
      sheet: { by: 'A.', paper: 'A4' },
    });
    for (const { clear } of jobSettings()) if (clear) session = clear(session);
    session = turned(session, 'sheet.paper', -1);
    expect(Object.keys(written(session))).toEqual([
      'thrice',
      'title',
      'units',
      'combinations',
      'best',
      'members',
    ]);
  });

  it("keeps the user's own text of a wood with typed values until it is changed", () => {
    const stock = {
      product: 'LVL',
      grade: '2.1E',
      values: { Fb: '19.65 MPa', Fv: '2 MPa', Fcperp: '750 psi', E: '14000 MPa', Emin: '7000 MPa', G: 0.5 },
      valuesFrom: 'report',
    };
    const text = JSON.stringify({ ...JSON.parse(sessionText({})), stock });
    expect(written(opened(text)).stock).toEqual(stock);
    expect(readSession(text.replace('"LVL"', '"timber"'), 'x.json')).toMatchObject({
      ok: false,
      fault: expect.stringContaining('stock.species: missing'),
    });
    expect(readSession(text.replace('"grade":"2.1E"', '"species":7'), 'x.json').ok).toBe(false);
  });

  it.each([
    ['title', 'x'.repeat(501), 'at most 500 characters'],
    ['title', 'a\u0007b', 'control or invisible'],
    ['sheet.firm', 'x'.repeat(121), 'at most 120 characters'],
    ['stock.species', 'Balsa', 'species is one of'],
    ['stock.product', 'custom', 'values'],
  ])('refuses for %s what a file would not take', (key, text, reason) => {
    const change = setting(key).enter!(opened(), text);
    expect('fault' in change && change.fault).toContain(reason);
  });

  it('offers price as best only where something has one', () => {
    const bests = (session: Session) => {
      const seen = new Set<string>();
      let now = session;
      for (let at = 0; at < 6; at += 1) {
        seen.add(setting('best').show(now));
        now = turned(now, 'best');
      }
      return [...seen];
    };
    expect(bests(opened())).toEqual(['lightest', 'shallowest', 'least wood']);
    expect(
      bests({
        ...opened(),
        prices: [
          { size: null, product: null, species: null, grade: null, price: { amount: 1, per: 'foot' } },
        ],
      }),
    ).toContain('cheapest');
  });

  it('whatever is turned, typed or cleared, the file reads back the same', () => {
    const keys = jobSettings().map(({ key }) => key);
    const change = fc.tuple(
      fc.constantFrom(...keys),
      fc.constantFrom('more', 'less', 'type', 'clear'),
      fc.string({ unit: 'grapheme', maxLength: 130 }),
    );
    fc.assert(
      fc.property(fc.array(change, { maxLength: 12 }), (changes) => {
        let session = opened();
        for (const [key, how, text] of changes) {
          const { turn, enter, clear } = setting(key);
          const next =
            how === 'type'
              ? enter?.(session, text)
              : how === 'clear'
                ? clear && { session: clear(session) }
                : turn?.(session, how === 'more' ? 1 : -1);
          if (next !== undefined && 'session' in next) session = next.session;
        }
        const again = opened(writeSession(session));
        expect(writeSession(again)).toBe(writeSession(session));
        expect(jobSettings().map(({ show }) => show(again))).toEqual(
          jobSettings().map(({ show }) => show(session)),
        );
      }),
    );
  });
});

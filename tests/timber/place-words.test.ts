import { describe, expect, it } from 'vitest';
import { answerOf } from '../../src/screen/answer.ts';
import { demandText } from '../../src/screen/gauge-view.ts';
import { verdictOf } from '../../src/screen/verdict-text.ts';
import { viewOf } from '../../src/screen/view-model.ts';
import type { Member } from '../../src/timber/member.ts';
import { checkAndPlace, placeOf } from '../../src/timber/place-words.ts';
import type { CheckId } from '../../src/timber/report.ts';
import { memberOf } from '../support/session.ts';
import { stateOf } from '../support/state.ts';

const reason = (member: Member) => verdictOf(member, answerOf(member), 'us').reason;
const result = (member: Member, id: CheckId) =>
  answerOf(member).report.checks.find((each) => each.id === id)!;

const GIRDER = { spans: ['14 ft', '12 ft'] };
const UPLIFT = { use: 'roof', area: { dead: '5 psf', windUp: '60 psf' }, tiedDown: ['9 kip', '9 kip'] };

describe('the verdict', () => {
  it('names no place on a plain span, where there is but one', () => {
    expect(reason(memberOf())).toBe('Bending stops it at 1.65.');
  });

  it('names the support or the span where a check is worst', () => {
    expect(reason(memberOf(GIRDER))).toMatch(/^Bending over support 2 stops it at \d\.\d\d\.$/);
    const held = memberOf({ spans: ['20 ft'], fixed: { left: true } });
    expect(reason(held)).toMatch(/^Bending at the fixed end stops it/);
    expect(reason(memberOf({ supports: 'cantilever', spans: ['8 ft'] }))).toMatch(
      /^Bending at the fixed end stops it/,
    );
  });

  it('says which spans are loaded where the worst is not all of them', () => {
    const member = memberOf({ spans: ['14 ft', '4 ft'], overhangs: { right: '2 ft' } });
    expect(result(member, 'bending').pattern).not.toBe('all spans');
    expect(checkAndPlace(member, result(member, 'bending'), true)).toBe('Bending in span 1');
    const long = memberOf({ spans: ['15 ft'], overhangs: { left: '1 ft', right: '1 ft' } });
    expect(reason(long)).toMatch(/^Bending in the span stops it at \d\.\d\d, live on span 1\.$/);
  });

  it('speaks of upward bending where a span is lifted', () => {
    const lifted = memberOf({ ...UPLIFT, spans: ['20 ft'] });
    expect(checkAndPlace(lifted, result(lifted, 'bending-hogging'), true)).toBe('Upward bending');
  });

  it('names the support that lifts and what would hold it, and what is next', () => {
    const member = memberOf({ ...UPLIFT, tiedDown: undefined, spans: ['20 ft'] });
    expect(reason(member)).toMatch(/^Uplift at support \d stops it: it is untied\.$/);
    const { cures } = verdictOf(member, answerOf(member), 'us');
    expect(cures[0]).toMatch(/^Tie it down for \d+ lb\.$/);
    expect(cures[1]).toMatch(/^Then [a-z ]+ stops it at \d/);
  });

  it('shortens all lengths in step where there are several, and says so', () => {
    const cures = (member: Member) => verdictOf(member, answerOf(member), 'us').cures.join(' ');
    expect(cures(memberOf({ spans: ['14 ft', '12 ft'], selfWeight: false }))).toContain(
      'Or shorten all, the longest span to',
    );
    expect(cures(memberOf())).toContain('Or shorten to');
  });
});

describe('the place of a check', () => {
  it('is that of the overhang by its side, and of the arm of a cantilever', () => {
    const deck = memberOf({ spans: ['6 ft'], overhangs: { right: '4 ft' } });
    expect(placeOf(deck, result(deck, 'deflection-live'))).toBe('of the right overhang');
    const arm = memberOf({ supports: 'cantilever', spans: ['5 ft'] });
    expect(placeOf(arm, result(arm, 'deflection-live'))).toBe('of the arm');
    expect(placeOf(arm, result(arm, 'shear'))).toBe('at the fixed end');
  });

  it('counts the spans from the left, past an overhang', () => {
    const member = memberOf({ spans: ['6 ft', '14 ft'], overhangs: { left: '1 ft' } });
    expect(placeOf(member, result(member, 'deflection-live'))).toBe('of span 2');
    expect(placeOf(member, result(member, 'bearing'))).toBe('at support 2');
  });
});

describe('the line under a gauge', () => {
  it('says where, and of what length the limit is', () => {
    const deck = memberOf({ spans: ['6 ft'], overhangs: { right: '4 ft' } });
    expect(demandText(deck, result(deck, 'deflection-live'), 'us')).toContain(
      'l/360 of twice the right overhang',
    );
    const girder = memberOf(GIRDER);
    expect(demandText(girder, result(girder, 'bending-hogging'), 'us')).toContain(' psi over support 2, D+L');
    expect(demandText(girder, result(girder, 'bending-hogging'), 'us', true)).toMatch(/ psi, D\+L$/);
    expect(demandText(memberOf(), result(memberOf(), 'bending'), 'us')).toBe('fb 1486 of 900 psi, D+L');
  });
});

describe('the remarks', () => {
  it('say what l/h and reach go by where there is more than one length, and the handover is left out', () => {
    const view = viewOf(stateOf([{ spans: ['6 ft'], overhangs: { right: '4 ft' } }]));
    expect(view.remarks[0]).toMatch(
      /^l\/h goes by .*; reach moves all lengths in step and names the longest span$/,
    );
    expect(view.handover).toBeNull();
    expect(viewOf(stateOf()).remarks[0]).not.toContain('l/h');
  });
});

import { showSpan, type Units } from '../../quantity/index.ts';
import type { Bracing, Member } from '../../timber/member.ts';
import { LONGEST } from './beam.ts';
import { choiceKnob, type Knob, measureKnob, SCALES, stepped } from './knob.ts';
import { stated } from './stated.ts';

function longestField(member: Member): number {
  return Math.max(...member.beam.spans, member.beam.overhangs.left, member.beam.overhangs.right);
}

/** Unbraced length of an edge: held throughout, then lengths, then held at the supports only. */
function unbraced(key: 'bracing' | 'bracingBottom', label: string): Knob {
  const put = (member: Member, value: Bracing): Member => ({
    ...member,
    [key]: value,
    assumed: stated(member, key),
  });
  const show = (value: Bracing, units: Units) =>
    value === 'continuous' ? 'held' : value === 'ends' ? 'ends only' : showSpan(value, units);
  const words = choiceKnob<Bracing>({
    key,
    label,
    choices: () => ['continuous', 'ends'],
    get: (member) => member[key],
    put,
    show,
  });
  const lengths = measureKnob({
    key,
    label,
    kind: 'length',
    scale: SCALES.tributary,
    least: 1,
    most: LONGEST,
    get: (member) =>
      member[key] === 'continuous' ? 0 : member[key] === 'ends' ? longestField(member) : member[key],
    put,
    show: showSpan,
  });
  return {
    ...words,
    number: null,
    show: (member, units) => show(member[key], units),
    nudge(member, direction, step, units) {
      const now = member[key];
      const { unit } = SCALES.tributary[units];
      const by = SCALES.tributary[units][step];
      if (direction > 0) {
        if (now === 'ends') return { fault: `${label}: held at the supports only is the longest there is` };
        const next = stepped(now === 'continuous' ? 0 : now, by, unit);
        return { member: put(member, next >= longestField(member) ? 'ends' : next) };
      }
      if (now === 'continuous') return { fault: `${label}: held throughout is the shortest there is` };
      const next = stepped(now === 'ends' ? longestField(member) : now, -by, unit);
      return { member: put(member, next < unit ? 'continuous' : next) };
    },
    enter(member, text, units) {
      const word = text.trim().toLowerCase();
      if (word !== '' && 'held'.startsWith(word)) return { member: put(member, 'continuous') };
      if (word !== '' && 'ends only'.startsWith(word)) return { member: put(member, 'ends') };
      return lengths.enter(member, text, units);
    },
    hint: (units) => `held, ends, ${SCALES.tributary[units].hint}`,
    stepText: (units) => SCALES.tributary[units].stepText,
  };
}

export const UNBRACED_TOP = unbraced('bracing', 'unbraced');
export const UNBRACED_BOTTOM = unbraced('bracingBottom', 'unbraced below');

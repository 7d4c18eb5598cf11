import { checkChange } from '../../timber/index.ts';
import type { Member } from '../../timber/member.ts';
import { choiceKnob, type Knob } from './knob.ts';
import { stated } from './stated.ts';

export const service = choiceKnob({
  key: 'service',
  label: 'service',
  choices: () => ['dry', 'wet'] as const,
  get: (member) => member.service,
  put: (member, value) => ({ ...member, service: value, assumed: stated(member, 'service') }),
  show: (value) => value,
  check: checkChange,
});

export const temperature = choiceKnob({
  key: 'temperature',
  label: 'temperature',
  choices: () => ['normal', '100-125 F', '125-150 F'] as const,
  get: (member) => member.temperature,
  put: (member, value) => ({ ...member, temperature: value, assumed: stated(member, 'temperature') }),
  show: (value) => value,
});

export const incised = yesNo('incised', 'incised', (member, value) => ({ ...member, incised: value }));

export const repetitive = yesNo('repetitive', 'repetitive', (member, value) => ({
  ...member,
  repetitive: value,
}));

export const seasoned = yesNo('seasoned', 'seasoned', (member, value) => ({
  ...member,
  seasoned: value,
  assumed: stated(member, 'seasoned'),
}));

/** Laid on its wide face. */
export const flat = choiceKnob<boolean>({
  key: 'flat',
  label: 'laid flat',
  choices: () => [false, true],
  get: (member) => member.section.flat,
  put: (member, value) => ({ ...member, section: { ...member.section, flat: value } }),
  show: yes,
  check: checkChange,
});

/** What is seldom touched: the conditions of the wood, then what the checks take of the loads. */
export const CONDITION_KNOBS: readonly Knob[] = [
  service,
  temperature,
  incised,
  repetitive,
  seasoned,
  yesNo('selfWeight', 'own weight', (member, value) => ({ ...member, selfWeight: value })),
  choiceKnob({
    key: 'shearAt',
    label: 'shear at',
    choices: () => ['support', 'd'] as const,
    get: (member) => member.shearAt,
    put: (member, value) => ({ ...member, shearAt: value }),
    show: (value) => (value === 'd' ? 'd from face' : 'support'),
  }),
  choiceKnob({
    key: 'creep',
    label: 'total takes',
    choices: () => ['half dead', 'Kcr'] as const,
    get: (member) => member.creep,
    put: (member, value) => ({ ...member, creep: value }),
    show: (value) => (value === 'Kcr' ? 'Kcr x dead' : 'half dead'),
  }),
  flat,
];

function yesNo(
  key: 'incised' | 'repetitive' | 'seasoned' | 'selfWeight',
  label: string,
  put: (member: Member, value: boolean) => Member,
): Knob {
  return choiceKnob<boolean>({
    key,
    label,
    choices: () => [false, true],
    get: (member) => member[key],
    put,
    show: yes,
    check: checkChange,
  });
}

function yes(value: boolean): string {
  return value ? 'yes' : 'no';
}

import { spanToDepthOf } from '../explore/span-to-depth.ts';
import { rankingOf } from '../session/index.ts';
import type { Member } from '../timber/member.ts';
import { answerOf } from './answer.ts';
import { pinsOf } from './pins.ts';
import { memberOf, type State } from './state.ts';
import type { GaugeView, RulerView } from './view.ts';
import { viewOf } from './view-model.ts';

/** The three laws over l/h with what stands along it. */
export interface ProportionView {
  readonly ruler: RulerView;
  /** Each law by its ratio at l/h of now; null where it does not apply. */
  readonly laws: readonly {
    readonly power: GaugeView['power'];
    readonly label: string;
    readonly ratio: number | null;
  }[];
  /** Largest ratio now, over all checks. */
  readonly worst: number;
  readonly pins: readonly { readonly label: string; readonly spanToDepth: number; readonly worst: number }[];
  readonly bands: readonly Band[];
  readonly sources: string;
}

/** A stretch of l/h that is usual. */
export interface Band {
  readonly label: string;
  /** 0: from the beginning of the axis. */
  readonly from: number;
  readonly to: number;
}

/** Usual l/h of timber: common practice, no source. */
const TIMBER_BANDS: readonly Band[] = [
  { label: 'joists', from: 16, to: 24 },
  { label: 'girders', from: 10, to: 16 },
  { label: 'glulam', from: 14, to: 20 },
];

/** Largest l/h of concrete beams whose deflection is not calculated (ACI 318-19 Table 9.3.1.1, from memory). */
const CONCRETE = { simple: 16, oneEndContinuous: 18.5, bothEndsContinuous: 21, cantilever: 8 } as const;

export function proportionView(state: State): ProportionView {
  const member = memberOf(state);
  const ranking = rankingOf(state.session);
  const { ruler, gauges } = viewOf(state);
  return {
    ruler,
    laws: gauges.map(({ power, label, ratio }) => ({ power, label, ratio })),
    worst: answerOf(member, ranking).worst,
    pins: pinsOf(state).map((pin, at) => ({
      label: String(at + 1),
      spanToDepth: spanToDepthOf(pin.member),
      worst: answerOf(pin.member, ranking).worst,
    })),
    bands: [...TIMBER_BANDS, { label: 'concrete', from: 0, to: concreteLimit(member) }],
    sources: 'usual: common practice; concrete at most: ACI 318 Table 9.3.1.1 (from memory)',
  };
}

/** By the supports of the member as a whole; of several spans the end ones decide. */
function concreteLimit({ beam }: Member): number {
  if (beam.supports === 'cantilever') return CONCRETE.cantilever;
  if (beam.fixed.left && beam.fixed.right) return CONCRETE.bothEndsContinuous;
  const continuous = beam.spans.length > 1 || beam.fixed.left || beam.fixed.right;
  return continuous ? CONCRETE.oneEndContinuous : CONCRETE.simple;
}

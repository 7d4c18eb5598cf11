import { spanToDepthOf } from '../explore/span-to-depth.ts';
import { type Band, usualBands } from '../explore/usual-proportions.ts';
import { rankingOf } from '../session/index.ts';
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
    bands: usualBands(member),
    sources: 'usual: common practice; concrete at most: ACI 318 Table 9.3.1.1 (from memory)',
  };
}

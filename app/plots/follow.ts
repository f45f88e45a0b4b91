import { settingAt } from '../../engine/index.ts';
import { frameLoop } from '../live/frame.ts';
import { currentReading, onReading } from '../live/reading.ts';
import type { PlotDrawer } from '../store/viewStore.ts';
import type { PlotSet } from './csv.ts';
import { type Costs, REST_MS, type Step, whenBehind, whenCoarse } from './pace.ts';
import type { Plot } from './plot.ts';
import type { Quality } from './source.ts';
import { type PlotQuestion, plotsFor } from './tabs.ts';

export interface PlotsClient {
  /** New plots, or the same in finer form. */
  readonly onSets: (sets: readonly PlotSet[]) => void;
  /** Whether the plots have been behind the drawing for a while. */
  readonly onBehind: (behind: boolean) => void;
  /** The reading has changed, though perhaps not what is plotted. */
  readonly onFrame: () => void;
}

interface Answer {
  readonly question: PlotQuestion;
  readonly quality: Quality;
  readonly plots: readonly Plot[];
}

/** One plot set that is wanted; `name` is empty when it is the only one. */
interface Target {
  readonly id: string;
  readonly name: string;
  readonly present: boolean;
  readonly question: PlotQuestion;
}

/** Follows the sketch with the plots of a tab, at the pace that pace.ts sets; returns the way to stop. */
export function followPlots(tab: PlotDrawer, client: PlotsClient): () => void {
  const answers = new Map<string, Answer>();
  let costs: Costs = { coarse: null, fine: null };
  let last: PlotQuestion | null = null;
  let changedAt = 0;
  let doneAt = Number.NEGATIVE_INFINITY;
  let timer: ReturnType<typeof setTimeout> | undefined;
  let behindTimer: ReturnType<typeof setTimeout> | undefined;

  const ask = () => frameLoop.ask('plots', 'plots', work);
  const later = (ms: number) => {
    timer = setTimeout(ask, ms);
  };

  const work = () => {
    clearTimeout(timer);
    const targets = targetsOf(tab);
    const present = targets.find((target) => target.present) ?? targets[0];
    if (!present) return;
    if (!last || !isSame(last, present.question)) changedAt = performance.now();
    last = present.question;
    const behind = targets.filter((target) => !isAnswered(target));
    noteBehind(behind.length > 0);
    const coarse = targets.filter((target) => answers.get(target.id)?.quality === 'coarse');
    const sinceChange = performance.now() - changedAt;
    if (behind.includes(present))
      carryOut(whenBehind(costs, sinceChange, performance.now() - doneAt), present);
    else {
      // Other positions, and finer plots, when the hand rests: one a frame, so that a new move comes between.
      const next = behind[0] ?? coarse[0];
      if (next) carryOut(whenCoarse(sinceChange), next);
    }
  };

  const isAnswered = ({ id, question }: Target): boolean => {
    const answer = answers.get(id);
    return answer !== undefined && isSame(answer.question, question);
  };

  const carryOut = (step: Step, target: Target) => {
    if (step.kind === 'wait') {
      later(step.ms);
      return;
    }
    const { quality } = step;
    const from = performance.now();
    const plots = plotsFor(target.question, quality);
    doneAt = performance.now();
    costs = { ...costs, [quality]: doneAt - from };
    answers.set(target.id, { question: target.question, quality, plots });
    show();
    later(0);
  };

  const show = () => {
    const sets = targetsOf(tab).flatMap(({ id, name }): PlotSet[] => {
      const answer = answers.get(id);
      return answer ? [{ position: name, plots: answer.plots }] : [];
    });
    client.onSets(sets);
  };

  const noteBehind = (behind: boolean) => {
    if (!behind) {
      clearTimeout(behindTimer);
      behindTimer = undefined;
      client.onBehind(false);
    } else behindTimer ??= setTimeout(() => client.onBehind(true), REST_MS);
  };

  const stopReading = onReading(() => {
    client.onFrame();
    ask();
  });
  ask();
  return () => {
    stopReading();
    clearTimeout(timer);
    clearTimeout(behindTimer);
    frameLoop.ask('plots', 'plots', () => {});
  };
}

function targetsOf(tab: PlotDrawer): readonly Target[] {
  const { sketch, setting, view } = currentReading();
  const question = { tab, sketch, setting, view: view.plots, unit: view.unit };
  if (!view.plots.all || sketch.positions.length < 2) return [{ id: '', name: '', present: true, question }];
  return sketch.positions.map(({ id, name }) => ({
    id,
    name,
    present: id === setting.at,
    question: { ...question, setting: settingAt(id) },
  }));
}

const isSame = (a: PlotQuestion, b: PlotQuestion): boolean =>
  a.sketch === b.sketch &&
  a.setting.at === b.setting.at &&
  a.setting.toNext === b.setting.toNext &&
  a.view === b.view &&
  a.unit === b.unit;

import { type Plot, valueText } from './plot.ts';

/** What a plot shows at a glance, in words: for those who do not see it. */
export function summaryOf(plot: Plot): string {
  switch (plot.kind) {
    case 'curves': {
      const spans = plot.curves.map(({ name, y }) => {
        if (y.length === 0) return `${name}: no ray`;
        const [low, high] = [y.reduce((a, b) => Math.min(a, b)), y.reduce((a, b) => Math.max(a, b))];
        return `${name} from ${valueText(low, plot.y)} to ${valueText(high, plot.y)}`;
      });
      return [...spans, ...plot.notes].join('; ');
    }
    case 'spots':
      return [...plot.figures, ...plot.notes].join('; ');
    case 'stems': {
      const largest = plot.stems.reduce<(typeof plot.stems)[number] | null>(
        (best, stem) => (best === null || Math.abs(stem.value) > Math.abs(best.value) ? stem : best),
        null,
      );
      const total = valueText(plot.stems.at(-1)?.sum ?? 0, plot.y);
      return largest
        ? `in all ${total}; most from ${largest.name}, ${valueText(largest.value, plot.y)}`
        : `in all ${total}`;
    }
    case 'empty':
      return plot.sentence;
  }
}

import { distortion, fieldCurves, illumination, sentenceOf } from '../../../engine/index.ts';
import { focusAxis, OVER_FIELD } from '../curves.ts';
import { curveStyle, emptyPlot, type Plot } from '../plot.ts';
import { evenAxis, reachOf } from '../scale.ts';
import type { Source } from '../source.ts';
import { lengthScale, lostNote, scaled } from '../words.ts';

const PER_CENT = 100;

/** Field curves, distortion and relative illumination over the field, in the main line. */
export const fieldPlots = (source: Source): readonly Plot[] => [
  curvesPlot(source),
  distortionPlot(source),
  illuminationPlot(source),
];

function curvesPlot(source: Source): Plot {
  const [key, title] = ['field curves', 'Field curves'];
  const [main] = source.sweeps();
  const found = main && fieldCurves(main);
  if (!found?.ok) return emptyPlot(key, title, sentenceOf(found ? found.why : 'ray lost'));
  const { tangential, sagittal } = found.value;
  const length = lengthScale(source.unit, 3);
  const curves = [
    {
      name: 'tangential',
      word: 'tangential',
      style: curveStyle('ink', 'main'),
      x: tangential.at,
      y: scaled(tangential.value, length.perMm),
    },
    {
      name: 'sagittal',
      word: 'sagittal',
      style: curveStyle('ink', 'short'),
      x: sagittal.at,
      y: scaled(sagittal.value, length.perMm),
    },
  ];
  return {
    kind: 'curves',
    key,
    title,
    x: OVER_FIELD,
    y: focusAxis(length, curves),
    curves,
    notes: lostNote(Math.max(tangential.lost, sagittal.lost)),
  };
}

function distortionPlot({ sweeps, view }: Source): Plot {
  const key = 'distortion';
  const title = view.distortion === 'paraxial' ? 'Distortion' : 'Distortion against f·θ';
  const [main] = sweeps();
  const found = main && distortion(main, view.distortion);
  if (!found?.ok) return emptyPlot(key, title, sentenceOf(found ? found.why : 'ray lost'));
  const { at, value, lost } = found.value;
  const curves = [
    {
      name: 'distortion',
      word: 'distortion',
      style: curveStyle('ink', 'main'),
      x: at,
      y: scaled(value, PER_CENT),
    },
  ];
  return {
    kind: 'curves',
    key,
    title,
    x: OVER_FIELD,
    y: evenAxis('of the height', '%', 3, reachOf(curves), 0.1),
    curves,
    notes: lostNote(lost),
  };
}

function illuminationPlot({ setup, shares, quality }: Source): Plot {
  const [key, title] = ['illumination', 'Relative illumination'];
  const found = illumination(setup, shares, { fine: quality === 'fine' });
  if (!found.ok) return emptyPlot(key, title, sentenceOf(found.why));
  const { at, value, lost } = found.value;
  const curves = [
    {
      name: 'illumination',
      word: 'light',
      style: curveStyle('ink', 'main'),
      x: at,
      y: scaled(value, PER_CENT),
    },
  ];
  const most = reachOf(curves);
  return {
    kind: 'curves',
    key,
    title,
    x: OVER_FIELD,
    y: {
      label: 'of the axis',
      unit: '%',
      digits: 1,
      from: 0,
      to: most > 100.5 ? Math.ceil(most / 20) * 20 : 100,
    },
    curves,
    notes: lostNote(lost),
  };
}

import type { ReactElement } from 'react';
import { renderToString } from 'react-dom/server';
import { beforeEach, describe, expect, it, vi } from 'vitest';
import { Ledger } from '../../../app/panels/Ledger.tsx';
import { PartCard } from '../../../app/panels/PartCard.tsx';
import { Positions } from '../../../app/panels/Positions.tsx';
import { Readouts } from '../../../app/panels/Readouts.tsx';
import { Scrubber } from '../../../app/panels/Scrubber.tsx';
import { SketchCard } from '../../../app/panels/SketchCard.tsx';
import { SummaryStrip } from '../../../app/panels/SummaryStrip.tsx';
import { TraceSheet } from '../../../app/panels/TraceSheet.tsx';
import { Warnings } from '../../../app/panels/Warnings.tsx';
import { openSketch } from '../../../app/store/sketchStore.ts';
import type { Selected } from '../../../app/store/viewStore.ts';
import { select, setView } from '../../../app/store/viewStore.ts';
import type { Sketch } from '../../../engine/index.ts';
import { insertPart, newPlate, newStop, setSemiDiameter, settingAt } from '../../../engine/index.ts';
import { inspectionZoom, MIDDLE, WIDE } from '../../engine/demo.ts';
import { afocal, empty, single } from './sketches.ts';

vi.stubGlobal('requestAnimationFrame', () => 0);

const NO_COMMANDS = new Map();

const show = (sketch: Sketch, element: ReactElement, ...selection: readonly Selected[]): string => {
  openSketch(sketch);
  select(...selection);
  return renderToString(element).replaceAll('<!-- -->', '');
};

const textOf = (html: string): string => html.replaceAll(/<[^>]*>/g, ' ').replaceAll(/\s+/g, ' ');

beforeEach(() => setView({ unit: 'mm', setting: settingAt(MIDDLE), foldedGroups: [], drawer: null }));

/** Every input has a label that names it, and no number is missing. */
function expectSound(html: string): void {
  const ids = [...html.matchAll(/<(?:input|select|textarea)[^>]*\bid="([^"]+)"/g)].map(([, id]) => id);
  const labelled = [...html.matchAll(/<label[^>]*\bfor="([^"]+)"/g)].map(([, id]) => id);
  expect(labelled).toEqual(expect.arrayContaining(ids));
  expect(html).not.toMatch(/NaN|undefined|\[object/);
}

describe('the readouts', () => {
  it('show the position and its numbers', () => {
    const text = textOf(show(inspectionZoom(), <Readouts />));
    expect(text).toContain('Middle position');
    expect(text).toContain('Focal length 41.198 mm');
    expect(text).toContain('Entrance diameter 7.349 mm');
  });

  it('show inches when they are asked for', () => {
    setView({ unit: 'in' });
    expect(textOf(show(inspectionZoom(), <Readouts />))).toContain('Focal length 1.62195 in');
  });

  it('show more of a group when asked, and nothing of a folded one', () => {
    setView({ foldedGroups: ['Power: all', 'Light'] });
    const text = textOf(show(inspectionZoom(), <Readouts />));
    expect(text).toContain('Front principal plane');
    expect(text).not.toContain('Working f-number');
  });

  it('say one thing for an empty sketch', () => {
    expect(textOf(show(empty(), <Readouts />))).toContain('There is nothing on the axis yet: add a part.');
  });
});

describe('the strip', () => {
  it('shows focal length, magnification, defocus and the count of warnings', () => {
    const text = textOf(show(inspectionZoom(), <SummaryStrip />));
    expect(text.trim()).toBe('f 41.198 mm m −0.0800 defocus 0.000 mm no warnings');
  });

  it('shows the angular magnification of an afocal layout', () => {
    expect(textOf(show(afocal(), <SummaryStrip />))).toContain('angular −0.5000');
  });
});

describe('the selected part', () => {
  const demo = inspectionZoom();
  const [first, second, , fourth] = demo.parts.map(({ id }) => id) as [
    Selected,
    Selected,
    Selected,
    Selected,
  ];

  it('shows nothing when nothing is selected', () => {
    expect(show(demo, <PartCard commands={NO_COMMANDS} />)).toBe('');
  });

  it('shows power, place, need, ledger line and work of an element', () => {
    const html = show(demo, <PartCard commands={NO_COMMANDS} />, second);
    const text = textOf(html);
    expectSound(html);
    expect(text).toContain('second group positive, thin');
    expect(html).toContain('value="28.000"');
    expect(html).toContain('value="26.272"');
    expect(text).toContain('needs 13.383 mm for no vignetting');
    expect(text).toContain('The stop rides on it, in front of its refraction.');
    expect(text).toContain('bends the marginal ray by');
  });

  it('names the need for the chosen vignetting beside the one for none', () => {
    const vignetted = { ...demo, field: { ...demo.field, vignetting: 0.3 } };
    const text = textOf(show(vignetted, <PartCard commands={NO_COMMANDS} />, fourth));
    expect(text).toMatch(/needs [\d.]+ mm for no vignetting, [\d.]+ mm for the chosen 30 %/);
  });

  it('gives the first part the object in front and the last the sensor behind', () => {
    expect(textOf(show(demo, <PartCard commands={NO_COMMANDS} />, first))).toContain('Object in front');
    expect(textOf(show(demo, <PartCard commands={NO_COMMANDS} />, fourth))).toContain('Sensor behind');
  });

  it('shows the thickness and the material of a plate, and the diameter of a stop', () => {
    const plate = insertPart(single(), newPlate(3), 20, 'only' as typeof WIDE);
    const plateId = plate.parts[1]?.id ?? 'object';
    expectSound(show(plate, <PartCard commands={NO_COMMANDS} />, plateId));
    expect(show(plate, <PartCard commands={NO_COMMANDS} />, plateId)).toContain('value="3.000"');
    const withStop = insertPart(single(), newStop(), -5, 'only' as typeof WIDE);
    const stopId = withStop.parts[0]?.id ?? 'object';
    expect(textOf(show(withStop, <PartCard commands={NO_COMMANDS} />, stopId))).toContain(
      'Make it the aperture stop',
    );
  });

  it('shows a given clear diameter, and "open" where none is', () => {
    const id = second as (typeof demo.parts)[number]['id'];
    const given = setSemiDiameter(demo, id, 6.7);
    expect(show(given, <PartCard commands={NO_COMMANDS} />, id)).toContain('value="13.400"');
    expect(show(demo, <PartCard commands={NO_COMMANDS} />, id)).toContain('placeholder="open"');
  });

  it('marks a gap that is the same at all positions, and one that is not', () => {
    const html = show(demo, <PartCard commands={NO_COMMANDS} />, fourth);
    expect(textOf(html)).toMatch(/Gap in front .*each .*Sensor behind .*= all/);
  });

  it('shows what several parts do together', () => {
    const html = show(demo, <PartCard commands={NO_COMMANDS} />, first, second);
    expectSound(html);
    expect(textOf(html)).toContain('2 parts');
    // 1/f = 1/f1 + 1/f2 − d/(f1 f2) with f −32 and 28, 26.2723430337247 apart.
    expect(html).toContain(`value="${(1 / (-1 / 32 + 1 / 28 + 26.2723430337247 / (32 * 28))).toFixed(3)}"`);
  });

  it('shows the ends of the axis', () => {
    expectSound(show(demo, <PartCard commands={NO_COMMANDS} />, 'object'));
    expect(show(demo, <PartCard commands={NO_COMMANDS} />, 'object')).toContain('value="500.000"');
    expect(show(demo, <PartCard commands={NO_COMMANDS} />, 'image')).toContain('value="8.800"');
  });
});

describe('the card of the sketch', () => {
  const OPEN = [
    'Zoom and focus positions',
    'Title and notes',
    'Lines and allowances',
    'Drawn',
    'Scale the sketch',
  ];

  it('adds a position to a sketch with one', () => {
    setView({ foldedGroups: ['sketch: Zoom and focus positions'] });
    expect(textOf(show(single(), <SketchCard />))).toContain('Add position');
  });

  it.each([
    ['the inspection zoom', inspectionZoom()],
    ['an empty sketch', empty()],
    ['an afocal one', afocal()],
  ])('labels every field of %s', (_name, sketch) => {
    setView({ foldedGroups: OPEN.map((name) => `sketch: ${name}`) });
    expectSound(show(sketch, <SketchCard />));
  });

  it('cautions where collimated light is taken in, and nowhere else', () => {
    expect(textOf(show(afocal(), <SketchCard />))).toContain('laser safety officer');
    expect(textOf(show(inspectionZoom(), <SketchCard />))).not.toContain('laser');
    expect(textOf(show(empty(), <SketchCard />))).not.toContain('laser');
  });

  it('says why there is no chief ray', () => {
    expect(textOf(show(single(), <SketchCard />))).toContain('no chief ray: no stop');
  });
});

describe('the other panels', () => {
  it('go through the positions and say when the scrubber stands between two', () => {
    const html = show(inspectionZoom(), <Scrubber />);
    expect(textOf(html)).toContain('middle −0.080');
    expect(html).toContain('aria-valuetext="Middle position"');
    setView({ setting: { at: WIDE, toNext: 0.5 } });
    expect(textOf(show(inspectionZoom(), <Scrubber />))).toMatch(/between.*Add position here/);
  });

  it('offer a first position to a sketch with one', () => {
    expect(textOf(show(single(), <Scrubber />)).trim()).toBe('+ position');
  });

  it('leave their heading to a sheet that has one', () => {
    expect(textOf(show(inspectionZoom(), <Warnings titled={false} />)).trim()).toBe('none');
    expect(show(single(), <SketchCard titled={false} />)).not.toContain('<h2');
    expect(show(single(), <SketchCard />)).toMatch(/<h2[^>]*>Sketch<\/h2>/);
  });

  it('list the positions with their names', () => {
    const html = show(inspectionZoom(), <Positions />);
    expectSound(html);
    expect(html).toContain('value="narrow"');
  });

  it('list the ledger part by part', () => {
    expect(textOf(show(inspectionZoom(), <Ledger />))).toContain('first group −500.000 real');
  });

  it('explain the focal length by its trace sheet', () => {
    const text = textOf(show(inspectionZoom(), <TraceSheet onCopy={() => undefined} />));
    expect(text).toContain('Focal length 41.198 mm');
    expect(text).toContain('rear focal length n′/φ 41.198 mm');
  });

  it('say that there are no warnings', () => {
    expect(textOf(show(inspectionZoom(), <Warnings />)).trim()).toBe('Warnings none');
  });
});

import { batchTask, plainTask } from './kernel.ts';
import { RAYS, SURFACES } from './kernelPrescription.ts';
import { measure, type Timing } from './measure.ts';
import { type BenchRow, timeRow } from './row.ts';

/** What the kernel has to gain over an object for each surface. */
const LEAST_GAIN = 12;

const SIZE = `${RAYS} rays, ${SURFACES.length} surfaces`;

/** One block: with all rays kept as objects, what is measured would be the collector of garbage. */
const FEW = 128;

/** The batch kernel with failure handling, and what it is compared with that runs everywhere. */
export function kernelRows(): BenchRow[] {
  const { batch, aspheres } = measure({ batch: batchTask(false), aspheres: batchTask(true) });
  const { block, plain } = measure({ block: batchTask(false, FEW), plain: plainTask(FEW) });
  const few = `${FEW} rays, ${SURFACES.length} surfaces`;
  return [
    timeRow(`exact rays, batch kernel: ${SIZE}`, batch, batch, 'itself'),
    rateRow(batch),
    timeRow(`exact rays, batch kernel, 4 aspheres: ${SIZE}`, aspheres, batch, 'batch kernel'),
    timeRow(`exact rays, batch kernel: ${few}`, block, block, 'itself'),
    timeRow(`exact rays, an object a surface: ${few}`, plain, block, `batch kernel; at least ${LEAST_GAIN}`),
  ];
}

/** Rays times surfaces in a second. */
function rateRow({ samplesMs, medianMs }: Timing): BenchRow {
  const perSecond = (ms: number): number => (RAYS * SURFACES.length) / (1000 * ms);
  return {
    name: 'exact rays, batch kernel: million ray-surfaces per second',
    min: perSecond(Math.max(...samplesMs)),
    median: perSecond(medianMs),
    unit: 'M/s',
    ratio: 1,
    against: 'itself',
  };
}

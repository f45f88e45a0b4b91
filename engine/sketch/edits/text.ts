import type { Sketch } from '../types.ts';
import { withField } from './change.ts';

/** Sets the title of the sketch. */
export const setTitle = (sketch: Sketch, title: string): Sketch => withField(sketch, 'title', title);

/** Sets the notes that go with the sketch. */
export const setNotes = (sketch: Sketch, notes: string): Sketch => withField(sketch, 'notes', notes);

import { createStore } from 'zustand/vanilla';
import type { Edit, Sketch } from '../../engine/index.ts';
import { emptySketch } from '../../engine/index.ts';
import type { Document } from './document.ts';
import * as document from './document.ts';

/** The open document. Nothing that can be computed from it is kept in it. */
export const sketchStore = createStore<Document>(() => document.documentOf(emptySketch()));

const change = (next: (doc: Document) => Document) => sketchStore.setState(next, true);

/** Shows an edit while a gesture lasts; see `preview` in document.ts. */
export const previewEdit = (edit: Edit): void => change((doc) => document.preview(doc, edit));
/** Ends the gesture as one step of history. */
export const commitEdit = (): void => change(document.commit);
/** Ends the gesture and puts back what was there. */
export const cancelEdit = (): void => change(document.cancel);
/** Makes an edit as one step of history. */
export const applyEdit = (edit: Edit): void => change((doc) => document.apply(doc, edit));
export const undo = (): void => change(document.undo);
export const redo = (): void => change(document.redo);
/** Replaces the document; its history starts anew. */
export const openSketch = (sketch: Sketch): void => change(() => document.documentOf(sketch));
/** Takes the last note off the screen. */
export const dismissNote = (): void => change((doc) => (doc.note ? { ...doc, note: null } : doc));

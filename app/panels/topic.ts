import { createStore } from 'zustand/vanilla';
import { setView } from '../store/viewStore.ts';

/** Which readout the trace sheet explains. */
export const topicStore = createStore<{ readonly readoutId: string }>(() => ({ readoutId: 'focalLength' }));

/** Opens the trace sheet on a readout. */
export function showTheWorking(readoutId: string): void {
  topicStore.setState({ readoutId });
  setView({ drawer: 'trace' });
}

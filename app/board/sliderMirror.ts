import type { Grip, SliderFacts } from './grips.ts';

export interface SliderHandlers {
  /** An arrow key (±1) or page key (±10); right and up are positive. */
  readonly onStep: (gripId: string, steps: number, modifiers: { readonly shift: boolean }) => void;
  /** The grip whose slider has the focus, or null. */
  readonly onFocus: (gripId: string | null) => void;
  /** Enter or F2: type the value. */
  readonly onEnter: (gripId: string) => void;
}

export interface SliderMirror {
  /** Makes the slider elements match the grips that have one; writes only what changed. */
  update(grips: readonly Grip[]): void;
  /** Puts the focus on a grip's slider; false when there is none. */
  focus(gripId: string): boolean;
  focusedId(): string | null;
  destroy(): void;
}

/** Side of the slider elements, px. */
const SIZE_PX = 24;

const STEPS: Readonly<Record<string, number>> = {
  ArrowRight: 1,
  ArrowUp: 1,
  ArrowLeft: -1,
  ArrowDown: -1,
  PageUp: 10,
  PageDown: -10,
};

interface Kept {
  readonly element: HTMLElement;
  grip: Grip;
}

/**
 * Keeps a real slider element over every grip of a canvas, for keyboards and screen readers: transparent to the
 * pointer, in the order of the grips, without a framework. `host` lies over the canvas and takes the focus when a
 * focused grip goes away (give it a `tabindex`).
 */
export function createSliderMirror(host: HTMLElement, handlers: SliderHandlers): SliderMirror {
  const kept = new Map<string, Kept>();
  let order = '';

  const focusedId = (): string | null => {
    const active = host.ownerDocument.activeElement;
    for (const [id, { element }] of kept) if (element === active) return id;
    return null;
  };

  const create = (grip: Grip): Kept => {
    const element = host.ownerDocument.createElement('div');
    element.className = 'grip-slider';
    element.setAttribute('role', 'slider');
    element.style.cssText = `position:absolute;left:0;top:0;width:${SIZE_PX}px;height:${SIZE_PX}px;pointer-events:none`;
    element.addEventListener('focus', () => handlers.onFocus(grip.id));
    element.addEventListener('blur', () => handlers.onFocus(null));
    element.addEventListener('keydown', (event) => onKey(event, grip.id, handlers));
    write(element, null, grip);
    return { element, grip };
  };

  return {
    update(grips) {
      const shown = grips.filter((grip) => grip.slider !== null);
      const wanted = new Set(shown.map((grip) => grip.id));
      const focused = focusedId();
      if (focused !== null && !wanted.has(focused)) host.focus({ preventScroll: true });
      for (const [id, { element }] of kept) {
        if (wanted.has(id)) continue;
        element.remove();
        kept.delete(id);
      }
      for (const grip of shown) {
        const known = kept.get(grip.id);
        if (known === undefined) kept.set(grip.id, create(grip));
        else if (known.grip !== grip) {
          write(known.element, known.grip, grip);
          known.grip = grip;
        }
      }
      const nextOrder = shown.map((grip) => grip.id).join('\n');
      if (nextOrder !== order) {
        arrange(
          host,
          shown.map((grip) => kept.get(grip.id)?.element as HTMLElement),
        );
        order = nextOrder;
      }
    },
    focus(gripId) {
      kept.get(gripId)?.element.focus({ preventScroll: true });
      return kept.has(gripId);
    },
    focusedId,
    destroy() {
      for (const { element } of kept.values()) element.remove();
      kept.clear();
      order = '';
    },
  };
}

/** Puts the elements in order without moving the focused one, which would lose the focus. */
function arrange(host: HTMLElement, elements: readonly HTMLElement[]): void {
  const pivot = elements.indexOf(host.ownerDocument.activeElement as HTMLElement);
  elements.forEach((element, i) => {
    if (i !== pivot) host.insertBefore(element, i < pivot ? (elements[pivot] ?? null) : null);
  });
}

function onKey(event: KeyboardEvent, gripId: string, handlers: SliderHandlers): void {
  if (event.ctrlKey || event.metaKey || event.altKey) return;
  const steps = STEPS[event.key];
  const enters = event.key === 'Enter' || event.key === 'F2';
  if (steps === undefined && !enters) return;
  event.preventDefault();
  event.stopPropagation();
  if (steps === undefined) handlers.onEnter(gripId);
  else handlers.onStep(gripId, steps, { shift: event.shiftKey });
}

function write(element: HTMLElement, before: Grip | null, grip: Grip): void {
  if (before?.xPx !== grip.xPx || before.yPx !== grip.yPx) {
    const half = SIZE_PX / 2;
    element.style.transform = `translate(${tenth(grip.xPx - half)}px, ${tenth(grip.yPx - half)}px)`;
  }
  const old = before === null ? null : attributesOf(before);
  for (const [name, value] of Object.entries(attributesOf(grip))) {
    if (old !== null && old[name] === value) continue;
    if (value === null) element.removeAttribute(name);
    else element.setAttribute(name, value);
  }
}

function attributesOf(grip: Grip): Readonly<Record<string, string | null>> {
  const facts = grip.slider as SliderFacts;
  return {
    'data-grip': grip.id,
    'aria-label': grip.label,
    'aria-orientation': facts.orientation,
    'aria-valuenow': String(facts.valueNow),
    'aria-valuetext': facts.valueText,
    'aria-valuemin': facts.valueMin === undefined ? null : String(facts.valueMin),
    'aria-valuemax': facts.valueMax === undefined ? null : String(facts.valueMax),
    tabindex: grip.tabStop ? '0' : '-1',
  };
}

function tenth(px: number): number {
  return Math.round(px * 10) / 10;
}

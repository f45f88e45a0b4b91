/** As much of a document as the sliders over the canvas need, counting what is written to it. */
export class FakeElement {
  readonly attributes = new Map<string, string>();
  readonly style = { cssText: '', transform: '' };
  readonly children: FakeElement[] = [];
  className = '';
  parent: FakeElement | null = null;
  private readonly listeners = new Map<string, ((event: unknown) => void)[]>();

  constructor(readonly ownerDocument: FakeDocument) {}

  setAttribute(name: string, value: string): void {
    this.ownerDocument.writes++;
    this.attributes.set(name, value);
  }

  removeAttribute(name: string): void {
    this.attributes.delete(name);
  }

  insertBefore(child: FakeElement, next: FakeElement | null): void {
    this.ownerDocument.moves++;
    if (this.ownerDocument.activeElement === child) this.ownerDocument.activeElement = null;
    child.remove();
    this.children.splice(next === null ? this.children.length : this.children.indexOf(next), 0, child);
    child.parent = this;
  }

  remove(): void {
    if (this.parent === null) return;
    this.parent.children.splice(this.parent.children.indexOf(this), 1);
    this.parent = null;
  }

  addEventListener(type: string, listener: (event: unknown) => void): void {
    this.listeners.set(type, [...(this.listeners.get(type) ?? []), listener]);
  }

  emit(type: string, event: unknown = {}): void {
    for (const listener of this.listeners.get(type) ?? []) listener(event);
  }

  focus(): void {
    const before = this.ownerDocument.activeElement;
    if (before === this) return;
    this.ownerDocument.activeElement = this;
    before?.emit('blur');
    this.emit('focus');
  }
}

export class FakeDocument {
  activeElement: FakeElement | null = null;
  /** Attributes written and elements put in place so far. */
  writes = 0;
  moves = 0;

  createElement(): FakeElement {
    return new FakeElement(this);
  }
}

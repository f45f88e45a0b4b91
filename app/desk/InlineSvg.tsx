import { useEffect, useRef } from 'react';

interface InlineSvgProps {
  readonly svg: () => string;
  /** Drawn again when this changes. */
  readonly of: object;
  readonly label: string;
}

/** A drawing put into the page as elements, so that it prints sharp and in the page's own type. */
export function InlineSvg({ svg, of, label }: InlineSvgProps) {
  const place = useRef<HTMLDivElement>(null);

  useEffect(() => {
    if (!of) return;
    const root = new DOMParser().parseFromString(svg(), 'image/svg+xml').documentElement;
    if (root.localName !== 'svg') return;
    root.setAttribute('aria-hidden', 'true');
    place.current?.replaceChildren(document.importNode(root, true));
  }, [svg, of]);

  return <div ref={place} className="hand-over-drawing" role="img" aria-label={label} />;
}

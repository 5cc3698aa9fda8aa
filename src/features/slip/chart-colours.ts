import { useEffect, useState } from 'react';

const TOKENS = ['ink', 'faint', 'rule', 'edge', 'sheet', 'off', 'triode', 'saturated'] as const;

/** The theme's colours as a canvas can use them, which does not know custom properties. */
export type ChartColours = Readonly<Record<(typeof TOKENS)[number], string>>;

export function readColours(within: HTMLElement): ChartColours {
  const probe = within.appendChild(document.createElement('span'));
  const colours = {} as Record<keyof ChartColours, string>;
  for (const token of TOKENS) {
    probe.style.color = `var(--${token})`;
    colours[token] = getComputedStyle(probe).color;
  }
  probe.remove();
  return colours;
}

/** Changes whenever the page's theme may have changed. */
export function useThemeChanges(): number {
  const [changes, setChanges] = useState(0);
  useEffect(() => {
    const changed = () => setChanges((before) => before + 1);
    const system = matchMedia('(prefers-color-scheme: dark)');
    const chosen = new MutationObserver(changed);
    system.addEventListener('change', changed);
    chosen.observe(document.documentElement, { attributeFilter: ['data-theme'] });
    return () => {
      system.removeEventListener('change', changed);
      chosen.disconnect();
    };
  }, []);
  return changes;
}

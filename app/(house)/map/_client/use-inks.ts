import { useTheme } from 'next-themes';
import { useEffect, useState } from 'react';
import type { Ground } from '@/lib/shared/facet-colour';
import type { Inks } from './draw-strip';

export interface GraphInks extends Inks {
  ground: Ground;
  soft: string;
  /** The interface's letters, for labels on the canvas. */
  fontFamily: string;
}

/** The tokens as a canvas needs them: resolved colours, anew whenever the theme changes. Null until the page stands. */
export function useInks(): GraphInks | null {
  const { resolvedTheme } = useTheme();
  const [inks, setInks] = useState<GraphInks | null>(null);
  useEffect(() => {
    const ground: Ground = resolvedTheme === 'dark' ? 'dark' : 'light';
    const probe = document.createElement('span');
    document.body.append(probe);
    const resolve = (token: string) => {
      probe.style.color = `var(${token})`;
      return getComputedStyle(probe).color;
    };
    const [ink = '', soft = '', paper = '', wash = ''] = ['--ink', '--ink-soft', '--paper', '--wash'].map(resolve);
    const { fontFamily } = getComputedStyle(document.body);
    probe.remove();
    setInks({ ground, ink, soft, paper, wash, fontFamily });
  }, [resolvedTheme]);
  return inks;
}

/** The same colour, thinner: `oklch(0.2 0 0)` becomes `oklch(0.2 0 0 / 0.3)`. */
export function thinner(colour: string, alpha: number): string {
  return colour.replace(/\((.*)\)$/, (_, parts: string) => `(${parts.replaceAll(',', ' ')} / ${alpha})`);
}

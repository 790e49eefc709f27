import { useEffect, useMemo, useState } from 'react';
import { useTheme } from '../../lib/theme.ts';
import type { PlotTone } from './plotTypes.ts';

/** The colours that a canvas needs as plain values. */
export type PlotTokens = Record<PlotTone | 'muted' | 'line' | 'panel', string>;

function readTokens(): PlotTokens {
  const style = window.getComputedStyle(document.documentElement);
  // Without a style sheet (tests) every curve is grey, and told by its dash and name as on a grey print.
  const token = (name: string) => style.getPropertyValue(`--${name}`).trim() || '#777777';
  return {
    rotation: token('rotation'),
    ellipticity: token('ellipticity'),
    reflectance: token('reflectance'),
    ink: token('ink'),
    magnet: token('magnet'),
    accent: token('accent'),
    muted: token('muted'),
    line: token('line'),
    panel: token('panel'),
  };
}

/** Colours of the theme on screen, and a count that rises once the shipped font can be drawn on a canvas. */
export function usePlotTokens(): { tokens: PlotTokens; fontsReady: boolean } {
  const theme = useTheme();
  const [fontsReady, setFontsReady] = useState(false);
  useEffect(() => {
    let left = false;
    // jsdom has no font set; a canvas there draws nothing anyway.
    void Promise.resolve('fonts' in document ? document.fonts.ready : null).then(() => {
      if (!left) setFontsReady(true);
    });
    return () => {
      left = true;
    };
  }, []);
  // The tokens are read from the page, which changes with the theme.
  const tokens = useMemo(() => (theme ? readTokens() : readTokens()), [theme]);
  return { tokens, fontsReady };
}

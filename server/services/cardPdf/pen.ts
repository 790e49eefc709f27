import path from 'node:path';
import { openSync } from 'fontkit';
import type { Font } from 'fontkit';
import { projectRoot } from '../../projectRoot.ts';

/**
 * Text on a page of PDF: the shipped Roboto Flex comes in pieces by script, so each run of characters is set in the piece
 * that has them. Lengths in PostScript points (1/72 inch), y downwards.
 */

const FOLDER = path.join(projectRoot, 'node_modules', '@fontsource', 'roboto-flex', 'files');
const scripts = ['latin', 'latin-ext', 'greek', 'cyrillic', 'cyrillic-ext', 'vietnamese'] as const;

/** Asked of every run: digits of one width, and no joined letters, which text search would not find. */
const FEATURES: PDFKit.Mixins.OpenTypeFeatures[] = ['tnum', 'kern'];

/** What the font lacks, in characters that it has. */
const replacements: Record<string, string> = {
  ...{ '≥': '>=', '≤': '<=', '≠': '!=', '≈': '~', '√': 'sqrt', '→': '->', '∞': 'infinity', '\t': ' ' },
  ...{ '₀': '0', '₁': '1', '₂': '2', '₃': '3', '₄': '4', '₅': '5', '₆': '6', '₇': '7', '₈': '8', '₉': '9' },
};

type Script = (typeof scripts)[number];
type Run = { script: Script; text: string };

const coverage = new Map<Script, Font>();

function fontOf(script: Script): Font {
  const known = coverage.get(script);
  if (known) return known;
  const opened = openSync(fileOf(script));
  coverage.set(script, opened);
  return opened;
}

const fileOf = (script: Script) => path.join(FOLDER, `roboto-flex-${script}-400-normal.woff`);

function scriptOf(character: string): Script | null {
  const point = character.codePointAt(0)!;
  return scripts.find((script) => fontOf(script).hasGlyphForCodePoint(point)) ?? null;
}

/** Text in pieces that one font has. A character that none has stands as its number: nothing is dropped. */
function runsOf(text: string): Run[] {
  const runs: Run[] = [];
  for (const given of text.normalize('NFC')) {
    const number = given.codePointAt(0)!.toString(16).toUpperCase().padStart(4, '0');
    const shown = scriptOf(given) ? given : (replacements[given] ?? `[U+${number}]`);
    for (const character of shown) {
      const script = scriptOf(character) ?? 'latin';
      const last = runs.at(-1);
      // A space takes the font of what is before it: most have one.
      if (last && (last.script === script || character === ' ')) last.text += character;
      else runs.push({ script, text: character });
    }
  }
  return runs;
}

const MEASURED_AT = 1000;

/** Smaller type is not read on paper in a workshop: common practice, no source. */
const LEAST_SIZE = 6.5;

export type Align = 'left' | 'right';

export class Pen {
  readonly doc: PDFKit.PDFDocument;
  /** Of all sizes, down to the least, and distances; below 1 where much has to go on the page. */
  readonly scale: number;
  /** Of words at the size MEASURED_AT: every size is a multiple. */
  readonly #widths: Map<string, number>;

  constructor(doc: PDFKit.PDFDocument, scale: number, widths = new Map<string, number>()) {
    this.doc = doc;
    this.#widths = widths;
    this.scale = scale;
    for (const script of scripts) doc.registerFont(script, fileOf(script));
  }

  /** What type of this size is printed in. */
  #printed(size: number): number {
    return Math.max(LEAST_SIZE, size * this.scale);
  }

  /** The height of one line of this size. */
  lineHeight(size: number): number {
    return (this.scale < 1 ? 1.22 : 1.28) * this.#printed(size);
  }

  /**
   * Word by word, since words come again: whole lines at every break took most of a second. Kerning next to a space, which is
   * left out, only makes a line shorter.
   */
  widthOf(text: string, size: number): number {
    const [first = '', ...more] = text.split(' ');
    const width = more.reduce(
      (sum, word) => sum + this.#widthOfWord(' ') + this.#widthOfWord(word),
      this.#widthOfWord(first),
    );
    return (width * this.#printed(size)) / MEASURED_AT;
  }

  #widthOfWord(word: string): number {
    let known = this.#widths.get(word);
    if (known === undefined) {
      known = runsOf(word).reduce((sum, run) => {
        this.doc.font(run.script).fontSize(MEASURED_AT);
        return sum + this.doc.widthOfString(run.text, { features: FEATURES });
      }, 0);
      this.#widths.set(word, known);
    }
    return known;
  }

  /** Text broken into lines of at most this width, between words, or inside one that is longer than a line. */
  wrap(text: string, size: number, width: number): string[] {
    return text.split('\n').flatMap((paragraph) => {
      const lines: string[] = [];
      let line = '';
      for (const word of paragraph.split(' ')) {
        const longer = line === '' ? word : `${line} ${word}`;
        if (this.widthOf(longer, size) <= width) {
          line = longer;
          continue;
        }
        if (line !== '') lines.push(line);
        const pieces = this.#broken(word, size, width);
        lines.push(...pieces.slice(0, -1));
        line = pieces.at(-1)!;
      }
      return [...lines, line];
    });
  }

  #broken(word: string, size: number, width: number): string[] {
    if (this.widthOf(word, size) <= width) return [word];
    const pieces = [''];
    for (const character of word) {
      const longer = pieces.at(-1)! + character;
      if (pieces.at(-1) !== '' && this.widthOf(longer, size) > width) pieces.push(character);
      else pieces[pieces.length - 1] = longer;
    }
    return pieces;
  }

  /** One line, its upper edge at y. */
  line(text: string, at: { x: number; y: number; width: number; size: number; align?: Align }): void {
    const { y, width, size, align = 'left' } = at;
    let x = align === 'right' ? at.x + width - this.widthOf(text, size) : at.x;
    for (const run of runsOf(text)) {
      this.doc.font(run.script).fontSize(this.#printed(size));
      this.doc.text(run.text, x, y, { lineBreak: false, features: FEATURES });
      x += this.widthOf(run.text, size);
    }
  }

  rule(x: number, y: number, width: number, thickness = 0.4): void {
    this.doc
      .moveTo(x, y)
      .lineTo(x + width, y)
      .lineWidth(thickness)
      .strokeColor('black')
      .stroke();
  }
}

// @vitest-environment jsdom
import { cleanup, render } from '@testing-library/react';
import { afterEach, expect, it } from 'vitest';
import { Markdown } from './Markdown.tsx';

afterEach(cleanup);

function shown(text: string): HTMLElement {
  return render(<Markdown text={text} />).container;
}

it('renders emphasis, lists and links that open elsewhere and tell nobody where from', () => {
  const page = shown('**bold**\n\n- one\n- two\n\n[source](https://example.org/a)');
  expect(page.querySelector('strong')?.textContent).toBe('bold');
  expect(page.querySelectorAll('li')).toHaveLength(2);
  const link = page.querySelector('a');
  expect(link?.getAttribute('href')).toBe('https://example.org/a');
  expect(link?.getAttribute('rel')).toContain('noreferrer');
});

it('makes no element of the HTML in a note', () => {
  const page = shown(
    'before <script>alert(1)</script> <img src=x onerror="alert(2)"> <iframe src="https://example.org"></iframe>\n\n<svg onload="alert(3)"></svg>',
  );
  expect(page.querySelector('script, img, iframe, svg')).toBeNull();
  for (const element of page.querySelectorAll('*')) {
    expect(element.getAttributeNames().filter((name) => name.startsWith('on'))).toEqual([]);
  }
  expect(page.textContent).toContain('before');
});

it('keeps the text of a link that would run a script, and not the link', () => {
  const page = shown(
    '[a](javascript:alert(1)) [b](JaVaScRiPt:alert(1)) [c](data:text/html,x) [d](vbscript:x) <javascript:alert(1)>',
  );
  expect(page.querySelectorAll('a[href]')).toHaveLength(0);
  expect(page.textContent).toContain('a b c d');
});

it('fetches no picture, and shows the way to it instead', () => {
  const page = shown('![a plot](https://example.org/plot.png) ![bad](javascript:alert(1))');
  expect(page.querySelector('img')).toBeNull();
  expect([...page.querySelectorAll('a')].map((link) => link.getAttribute('href'))).toEqual([
    'https://example.org/plot.png',
  ]);
  expect(page.textContent).toContain('bad');
});

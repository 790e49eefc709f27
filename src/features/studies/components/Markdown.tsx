import ReactMarkdown from 'react-markdown';
import type { Components } from 'react-markdown';

/** Headings of a note stand below those of the page. */
const heading = 'mt-3 mb-1 font-semibold first:mt-0';

const components: Components = {
  h1: ({ children }) => <h3 className={`${heading} text-lead`}>{children}</h3>,
  h2: ({ children }) => <h3 className={heading}>{children}</h3>,
  h3: ({ children }) => <h4 className={heading}>{children}</h4>,
  p: ({ children }) => <p className="my-2 first:mt-0 last:mb-0">{children}</p>,
  ul: ({ children }) => <ul className="my-2 list-disc space-y-1 pl-5">{children}</ul>,
  ol: ({ children }) => <ol className="my-2 list-decimal space-y-1 pl-5">{children}</ol>,
  blockquote: ({ children }) => (
    <blockquote className="my-2 border-l-2 border-edge pl-3 text-muted">{children}</blockquote>
  ),
  code: ({ children }) => <code className="rounded-box bg-paper px-1 text-note">{children}</code>,
  pre: ({ children }) => (
    <pre className="my-2 overflow-x-auto rounded-control bg-paper p-2" tabIndex={0}>
      {children}
    </pre>
  ),
  // An address that is not safe arrives here empty: its text stays, the link does not.
  a: ({ href, children }) =>
    href ? (
      <a className="prose-link" href={href} target="_blank" rel="noreferrer nofollow">
        {children}
      </a>
    ) : (
      <span>{children}</span>
    ),
  // A picture would tell its server who reads the study: the way to it is shown instead.
  img: ({ src, alt }) =>
    typeof src === 'string' && src !== '' ? (
      <a className="prose-link" href={src} target="_blank" rel="noreferrer nofollow">
        {alt || 'picture'}
      </a>
    ) : (
      <span>{alt}</span>
    ),
};

/** Markdown of people. HTML in it is printed as text, never made part of the page. */
export function Markdown({ text }: { text: string }) {
  return (
    <div className="max-w-prose wrap-anywhere">
      <ReactMarkdown components={components}>{text}</ReactMarkdown>
    </div>
  );
}

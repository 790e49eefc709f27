/** The text of a mail with its addresses as links, as a mail program would show it. */
export function MailText({ text }: { text: string }) {
  const parts = text.split(/(https?:\/\/[^\s<>"]+)/);
  return (
    <p className="wrap-anywhere whitespace-pre-wrap">
      {parts.map((part, position) =>
        position % 2 === 1 ? (
          <a key={position} href={part} className="prose-link">
            {part}
          </a>
        ) : (
          part
        ),
      )}
    </p>
  );
}

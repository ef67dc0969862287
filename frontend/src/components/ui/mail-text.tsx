import { Link } from 'react-router';

/** A mail's plain text with its links to this very site made clickable; those lead elsewhere stay words. */
export function MailText({ text }: { text: string | null }) {
  if (text === null) return <p className="text-ink-2">The text is not kept any more, or was for its receiver alone.</p>;
  return (
    <div className="flex flex-col gap-3">
      {text
        .trim()
        .split(/\n{2,}/)
        .map((paragraph) => (
          <p key={paragraph} className="break-words whitespace-pre-line">
            {paragraph.split(/(https?:\/\/\S+)/).map((part) => (
              <Part key={part} part={part} />
            ))}
          </p>
        ))}
    </div>
  );
}

function Part({ part }: { part: string }) {
  const to = ownAddress(part);
  return to === undefined ? (
    part
  ) : (
    <Link to={to} className="inline-flex min-h-11 items-center break-all">
      {part}
    </Link>
  );
}

function ownAddress(part: string): string | undefined {
  if (!/^https?:\/\//.test(part) || !URL.canParse(part)) return undefined;
  const url = new URL(part);
  // A trial is reached as localhost and as 127.0.0.1; its mails name one of them.
  const here = new Set([window.location.host, `localhost:${window.location.port}`, `127.0.0.1:${window.location.port}`]);
  return here.has(url.host) ? url.pathname + url.search + url.hash : undefined;
}

const address = /(https?:\/\/\S+)/;

/** A message as it was written; only web addresses become links, and no other kind of address can. */
export function MailText({ text }: { text: string }) {
  return (
    <p className="break-words whitespace-pre-wrap">
      {text.split(address).map((part, index) =>
        index % 2 === 1 ? (
          <a key={index} href={part} rel="noreferrer" className="break-all text-indigo underline underline-offset-2">
            {part}
          </a>
        ) : (
          part
        ),
      )}
    </p>
  );
}

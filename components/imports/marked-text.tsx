/** Words in small letters without marks and punctuation, so that "Fore-shores" and "foreshores" differ and "V." and "V" do not. */
const plain = (word: string) => word.normalize('NFKD').replace(/[^\p{L}\p{N}]/gu, '').toLowerCase();

/** A text with the words marked that the other side does not have. Nothing is marked where the other side says nothing. */
export function MarkedText({ text, other }: { text: string | null; other: string | null }) {
  if (!text) return <span className="text-ink-soft">none</span>;
  if (!other) return <>{text}</>;
  const known = new Set(other.split(/\s+/).map(plain));
  const parts: { text: string; differs: boolean }[] = [];
  for (const word of text.split(/(\s+)/)) {
    const last = parts[parts.length - 1];
    const differs = word.trim() !== '' && plain(word) !== '' && !known.has(plain(word));
    if (last && (last.differs === differs || word.trim() === '')) last.text += word;
    else parts.push({ text: word, differs });
  }
  return (
    <>
      {parts.map((part, index) => (part.differs ? <mark key={index} className="bg-weld-wash text-ink underline decoration-weld decoration-2 underline-offset-4">{part.text}</mark> : part.text))}
    </>
  );
}

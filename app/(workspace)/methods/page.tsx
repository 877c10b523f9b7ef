import { type Metadata } from 'next';

import { agreements, cautions, definitions } from './definitions';
import { actorForPage } from '@/lib/access/actor';

export const metadata: Metadata = { title: 'Methods and cautions' };

function SourceLine({ text, doi }: { text: string; doi?: string }) {
  return (
    <li>
      {text}
      {doi && (
        <>
          . <a href={`https://doi.org/${doi}`} className="font-mono text-head break-all" rel="external noreferrer">{doi}</a>
        </>
      )}
    </li>
  );
}

/** What every figure means, where it misleads, and where the method comes from. Open to everybody who is signed in. */
export default async function MethodsPage() {
  await actorForPage();
  return (
    <div className="grid max-w-[74rem] gap-10 px-4 pt-6 pb-12 md:px-7 lg:grid-cols-[minmax(0,1fr)_15rem]">
      <div className="grid gap-10">
        <header className="grid max-w-[44rem] gap-2">
          <h1 className="text-title">Methods and cautions</h1>
          <p className="text-ink-soft">What each figure means, where it misleads, and where the method comes from. Every analysis also names its own parameters, seed and fingerprints.</p>
        </header>
        <section id="cautions" aria-labelledby="cautions-title" className="grid scroll-mt-6 gap-4">
          <h2 id="cautions-title" className="text-panel">Cautions</h2>
          <dl className="grid max-w-[52rem] gap-x-8 gap-y-4 border-l-[3px] border-weld pl-4 sm:grid-cols-2">
            {cautions.map(({ title, text }) => (
              <div key={title}>
                <dt className="font-semibold">{title}</dt>
                <dd className="text-table text-ink-soft">{text}</dd>
              </div>
            ))}
          </dl>
          <div className="max-w-[44rem] text-table text-ink-soft">
            <p>Institutions follow their own policy and their national rules. These say why figures of this kind need care:</p>
            <ul className="mt-1 list-disc pl-5">{agreements.map((source) => <SourceLine key={source.text} {...source} />)}</ul>
          </div>
        </section>
        {definitions.map(({ heading, entries }) => (
          <section key={heading} aria-label={heading} className="grid gap-1">
            <h2 className="border-b border-ink pb-2 text-panel">{heading}</h2>
            {entries.map((entry) => (
              <article key={entry.id} id={entry.id} aria-labelledby={`${entry.id}-name`} className="grid scroll-mt-6 gap-x-8 gap-y-2 border-b border-thread py-5 target:bg-weld-wash md:grid-cols-[12rem_minmax(0,1fr)]">
                <h3 id={`${entry.id}-name`} className="text-work">
                  <a href={`#${entry.id}`} className="text-ink no-underline hover:underline">{entry.name}</a>
                </h3>
                <div className="grid max-w-[44rem] gap-2">
                  <p>{entry.definition}</p>
                  {entry.formula && <p className="font-mono text-head leading-[1.125rem] text-ink-soft">{entry.formula}</p>}
                  <p className="text-table text-ink-soft"><span className="font-semibold text-weld-ink">Where it misleads.</span> {entry.misleads}</p>
                  {entry.sources.length > 0 && <ul aria-label={`Sources of ${entry.name}`} className="text-small text-ink-soft">{entry.sources.map((source) => <SourceLine key={source.text} {...source} />)}</ul>}
                </div>
              </article>
            ))}
          </section>
        ))}
      </div>
      <nav aria-label="On this page" className="hidden lg:block">
        <ul className="sticky top-6 grid gap-1 border-l border-thread pl-4 text-table">
          <li><a href="#cautions">Cautions</a></li>
          {definitions.flatMap(({ entries }) => entries).map((entry) => <li key={entry.id}><a href={`#${entry.id}`}>{entry.name}</a></li>)}
        </ul>
      </nav>
    </div>
  );
}

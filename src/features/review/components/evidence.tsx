import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { ScreeningResponse } from '#shared/contracts/screening.ts';
import { Icon } from '#src/components/icon.tsx';
import { formatFixed } from '#src/lib/numbers.ts';

/** What speaks for and against looseness, what could look alike, what is wrong with the record. */
export function Evidence({ result }: { result: ScreeningResponse['result'] }) {
  const speaksFor = result.evidence.filter((sentence) => sentence.for);
  const speaksAgainst = result.evidence.filter((sentence) => !sentence.for);
  return (
    <div className="grid items-start gap-5 lg:grid-cols-2">
      <div className="flex flex-col gap-5">
        <Part title="Speaks for looseness">
          {speaksFor.map(({ text }) => (
            <li key={text} className="border-l-4 border-evidence pl-2">
              {text}
            </li>
          ))}
        </Part>
        <Part title="Speaks against it">
          {speaksAgainst.map(({ text }) => (
            <li key={text} className="border-l-4 border-rule pl-2">
              {text}
            </li>
          ))}
        </Part>
        <Part title="Quality of the record" none="Nothing is wrong with it.">
          {result.quality.map(({ code, message, advice, forcesRetake }) => (
            <li key={code}>
              <span className={forcesRetake ? 'font-semibold' : ''}>{message}</span>{' '}
              <span className="text-ink-soft">{advice}</span>
            </li>
          ))}
        </Part>
        {result.speed.alternatives.length > 0 && (
          <Part title="Other speeds that fit about as well">
            {result.speed.alternatives.map(({ speedHz, reason }) => (
              <li key={`${speedHz} ${reason}`}>
                <span className="figures">{formatFixed(speedHz * 60, 0)} r/min</span>: {reason}
              </li>
            ))}
          </Part>
        )}
      </div>
      <div className="flex flex-col gap-5">
        <Part title="What could look alike">
          {/* What is still open is read first. */}
          {[...result.lookAlikes]
            .sort((a, b) => Number(a.ruledOut) - Number(b.ruledOut))
            .map(({ name, ruledOut, reason }) => (
              <li key={name} className="flex gap-2">
                <span className="mt-1">
                  <Icon name={ruledOut ? 'dash' : 'help'} size={12} />
                </span>
                <span>
                  <span className="font-medium">{name}</span>{' '}
                  <span className="text-ink-soft">
                    {ruledOut ? 'is ruled out' : 'is not ruled out'}: {reason}
                  </span>
                </span>
              </li>
            ))}
        </Part>
        <Link to="/method" className="ink-link self-start text-sm">
          How the method judges, and where it fails
        </Link>
      </div>
    </div>
  );
}

function Part({
  title,
  none = 'Nothing.',
  children,
}: {
  title: string;
  none?: string;
  children: readonly ReactNode[];
}) {
  return (
    <section>
      <h3 className="mb-1 text-sm font-semibold">{title}</h3>
      {children.length === 0 ? (
        <p className="text-sm text-ink-soft">{none}</p>
      ) : (
        <ul className="flex flex-col gap-1.5 text-sm">{children}</ul>
      )}
    </section>
  );
}

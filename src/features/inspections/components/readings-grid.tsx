import { useId } from 'react';
import type { SeatName } from '#shared/contracts/fit-record.ts';
import { planes, readingDirectionsDeg, type SeatReading } from '#shared/contracts/inspection.ts';
import { FieldError } from '#src/components/field.tsx';
import { NumberInput } from '#src/components/number-input.tsx';
import { partWords } from './inspection-words.ts';
import { readingQuestion } from './readings-meaning.ts';
import { placeKey, readingMm, type LengthUnit } from './report-draft.ts';

/** Two planes by four directions, as a micrometer is set; a reading that can't be right is asked about. */
export function ReadingsGrid({
  seat,
  part,
  unit,
  nominalMm,
  readings,
  onRead,
}: {
  seat: SeatName;
  part: SeatReading['part'];
  unit: LengthUnit;
  nominalMm: number | null;
  readings: Readonly<Record<string, string>>;
  onRead: (key: string, typed: string) => void;
}) {
  const gridId = useId();
  const title = partWords[seat][part];
  const questions = planes.flatMap((plane) =>
    readingDirectionsDeg.flatMap((directionDeg) => {
      const key = placeKey(part, plane, directionDeg);
      const value = readingMm(readings[key], unit);
      const question = value === undefined ? null : readingQuestion(value, nominalMm);
      return question === null ? [] : [{ key, plane, directionDeg, question }];
    }),
  );
  return (
    <fieldset>
      <legend className="mb-1 text-sm font-medium">
        {title}, <span className="figures">{unit}</span>
      </legend>
      {/* Planes side by side, directions beneath: two columns leave room for six figures on a phone. */}
      <table className="w-full max-w-md table-fixed border-separate border-spacing-x-1 border-spacing-y-1 text-sm">
        <thead>
          <tr>
            <th scope="col" className="w-14 text-left text-xs font-normal text-ink-faint">
              Angle
            </th>
            {planes.map((plane) => (
              <th key={plane} scope="col" className="text-right text-xs font-normal text-ink-faint">
                Plane <span className="figures">{plane}</span>
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {readingDirectionsDeg.map((directionDeg) => (
            <tr key={directionDeg}>
              <th scope="row" className="figures text-left font-normal">
                {directionDeg}°
              </th>
              {planes.map((plane) => {
                const key = placeKey(part, plane, directionDeg);
                const isAsked = questions.some((question) => question.key === key);
                return (
                  <td key={key}>
                    <NumberInput
                      id={`${gridId}-${key}`}
                      aria-label={`${title}, plane ${plane}, ${directionDeg}°`}
                      aria-invalid={isAsked || undefined}
                      {...(isAsked ? { 'aria-describedby': `${gridId}-${key}-question` } : {})}
                      value={readings[key] ?? ''}
                      onChange={(event) => onRead(key, event.target.value)}
                    />
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
      {questions.map(({ key, plane, directionDeg, question }) => (
        <FieldError key={key} id={`${gridId}-${key}-question`}>
          {`Plane ${plane}, ${directionDeg}°: ${question}`}
        </FieldError>
      ))}
    </fieldset>
  );
}

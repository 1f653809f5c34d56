import { inspectionReport } from '#shared/contracts/inspection.ts';
import type { FormFault } from '#src/components/form-error-summary.tsx';

type Draft = {
  inPlaceChecks: readonly { check: string }[];
  seats: readonly { seat: string; stage: string }[];
};

/** The contract's faults of a report in the words of the form, each leading to its input. */
export function reportFaults(report: Draft): FormFault[] {
  const parsed = inspectionReport.safeParse(report);
  if (parsed.success) return [];
  const faults = new Map<string, FormFault>();
  for (const { path, message } of parsed.error.issues) {
    const fault = faultOf(report, path, message);
    // One fault an input is enough to mend it.
    const key = fault.inputId ?? fault.message;
    if (!faults.has(key)) faults.set(key, fault);
  }
  // The result is the form's last question, though the contract's first.
  const inOrder = [...faults.values()];
  return [
    ...inOrder.filter((fault) => fault.inputId !== 'outcome'),
    ...inOrder.filter((fault) => fault.inputId === 'outcome'),
  ];
}

function faultOf(report: Draft, path: readonly PropertyKey[], message: string): FormFault {
  const [field, index, inner] = path;
  if (field === 'outcome') return { message: 'Choose a result.', inputId: 'outcome' };
  if (field === 'inPlaceChecks' && typeof index === 'number') {
    const check = report.inPlaceChecks[index]?.check ?? '';
    return {
      inputId: `in-place-${check.replaceAll(' ', '-')}`,
      message:
        inner === 'finding'
          ? `Say whether the ${check} is sound, at fault or was not checked.`
          : `The reading of the ${check} is no number that can be.`,
    };
  }
  if (field === 'seats' && typeof index === 'number') {
    const told = report.seats[index];
    const name = `${told?.seat ?? ''} seat ${told?.stage ?? ''}`;
    if (inner === 'condition') {
      return {
        inputId: `condition-${told?.seat ?? ''}-${(told?.stage ?? '').replace(' ', '-')}`,
        message: `Choose the condition of the ${name}.`,
      };
    }
    return { message: `A reading of the ${name} is no number between 1 and 3000 mm.` };
  }
  return typeof field === 'string' ? { inputId: field, message } : { message };
}

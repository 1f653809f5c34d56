import type { SelectOption } from '#src/components/select.tsx';
import { criticalities, machineKinds, mountings } from '#shared/contracts/machine.ts';

const capital = (word: string) => word.charAt(0).toUpperCase() + word.slice(1);

/** Choices from a contract's list: the word itself, with a capital. */
export const optionsOf = (words: readonly string[]): SelectOption[] =>
  words.map((word) => ({ value: word, label: capital(word) }));

export const kindOptions = optionsOf(machineKinds);
export const criticalityOptions = optionsOf(criticalities);
export const mountingOptions = optionsOf(mountings);
export { capital };

/** Where the method fails, said before anybody relies on it. */
const limits: readonly { name: string; text: string }[] = [
  {
    name: '“No looseness signs” is no proof of a tight fit.',
    text: 'It says that no run, no fractions, no truncation and no raised floor were found in this record. A pedestal or foot lifts only while the unbalance force over the weight exceeds |1 − r²|, r being speed over its natural frequency: well above resonance a loose machine can show 1× alone.',
  },
  {
    name: 'A run of harmonics alone proves nothing.',
    text: 'Sound machines with misalignment, couplings, gears, blades or a weak mount show runs too. What counts is level, fall-off, fractions and the shaft’s share of the vibration together, and the machine’s own earlier surveys.',
  },
  {
    name: 'With one sensor, 1× to 3× may be either.',
    text: 'Incipient pedestal or foot looseness and misalignment overlap there. Measure the other directions, and the phase on both sides of the joint.',
  },
  {
    name: 'Rub and reciprocating machines show running-speed families by nature.',
    text: 'Where the register says that a machine is of such a kind, the score is lowered and the evidence says so.',
  },
  {
    name: 'The figures below come from simulated machines and a few public recordings.',
    text: 'They claim nothing for the field until inspections have said so; the outcomes of a site’s own inspections are the measure that counts.',
  },
];

export function MethodLimits() {
  return (
    <ul className="grid gap-x-8 gap-y-3 lg:grid-cols-2">
      {limits.map((limit) => (
        <li key={limit.name}>
          <h3 className="text-sm font-semibold">{limit.name}</h3>
          <p className="max-w-prose text-sm text-ink-soft">{limit.text}</p>
        </li>
      ))}
    </ul>
  );
}

interface Step {
  name: string;
  text: string;
}

/** The eight steps, as an analyst would want them told. */
const steps: readonly Step[] = [
  {
    name: 'Is the record fit to be judged?',
    text: 'Gaps, dropouts, an overloaded input (one and the same extreme value on one side or both, also where the instrument integrated afterwards), a sensor still settling, drift that buries the orders, too few revolutions (8), too few orders in the band (5), too few levels of the converter. Each defect says what to set at the retake. A record that is cut off by the instrument is never taken for a machine that hits a stop.',
  },
  {
    name: 'Running speed',
    text: 'A told speed is refined within ±3 % by the whole family of orders, by least squares over the lines and then over their phases; without one it is estimated within the machine’s range. The result carries a 95 % interval and how it was found. Where half or double the speed explains the lines about as well, or the line frequency stands next to 1×, that is said.',
  },
  {
    name: 'Spectra over the shaft angle',
    text: 'Velocity is integrated in the frequency domain from two tenths of running speed up, slow changes of speed are followed by the phase of a strong order and taken out by resampling, so that the tenth order is as sharp as the first. Hann window, half-overlapping segments; amplitudes are corrected for the window’s gain, noise for its bandwidth.',
  },
  {
    name: 'Order table',
    text: 'Every order from a third to twenty in steps of a half and a third: velocity, the floor beside it from a median that lines do not lift, how far it stands out in dB, and the chance that noise alone gives as much (F-distribution for the averages actually used). Orders that the line frequency, blades, gear mesh, a belt, a bearing defect or a neighbour machine explain are marked with it and count less.',
  },
  {
    name: 'Harmonic run',
    text: 'The longest unbroken run of orders that stand out, its fall-off, halves and thirds, and the chance of such a run or of such a family by luck. On noise alone the stated chance is held: see the figures.',
  },
  {
    name: 'Truncation',
    text: 'How long the averaged revolution dwells near its extremes in displacement, beside a sine. It counts as evidence where the machine, not the instrument, does it.',
  },
  {
    name: 'Other signs',
    text: 'Level of the family, the share of the vibration that is synchronous with the shaft, the strongest line out of step, a raised floor between the orders, a single order alone above its neighbours, the overall velocity as ISO 20816 measures it.',
  },
  {
    name: 'Score and verdict',
    text: 'A sum of named parts, each limited, through a logistic function: a number between 0 and 1 that is meant to be read as a chance on records like those it was fitted on. “Suspected” and “likely” begin at limits that stand with every screening.',
  },
];

export function MethodSteps() {
  return (
    <ol className="grid gap-x-8 gap-y-4 lg:grid-cols-2">
      {steps.map((step, index) => (
        <li key={step.name} className="flex gap-3">
          <span aria-hidden="true" className="figures text-lg text-ink-faint">
            {index + 1}
          </span>
          <div>
            <h3 className="text-sm font-semibold">{step.name}</h3>
            <p className="max-w-prose text-sm text-ink-soft">{step.text}</p>
          </div>
        </li>
      ))}
    </ol>
  );
}

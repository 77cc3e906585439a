const steps = [1, 2, 3, 4, 5, 6] as const;

/** The temper scale from left to right, as paint for one SVG; use it with `fill={`url(#${id})`}`. */
export function TemperGradient({ id }: { id: string }) {
  return (
    <linearGradient id={id}>
      {steps.map((step, i) => (
        <stop key={step} offset={i / (steps.length - 1)} className={stopClasses[step]} />
      ))}
    </linearGradient>
  );
}

const stopClasses = {
  1: "[stop-color:theme(colors.temper.1)]",
  2: "[stop-color:theme(colors.temper.2)]",
  3: "[stop-color:theme(colors.temper.3)]",
  4: "[stop-color:theme(colors.temper.4)]",
  5: "[stop-color:theme(colors.temper.5)]",
  6: "[stop-color:theme(colors.temper.6)]",
};

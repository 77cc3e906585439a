/** How people write a unit, by the name it has in `typedUnits`. Lower case, without spaces and full stops. */
const spellings: Record<string, readonly string[]> = {
  in: ['"', "inch", "inches", "ins"],
  ft: ["'", "feet", "foot"],
  thou: ["thous"],
  um: ["micron", "microns", "μm"],
  mm: ["millimetre", "millimetres", "millimeter", "millimeters"],
  cm: ["centimetre", "centimetres", "centimeter", "centimeters"],
  a: ["amp", "amps", "ampere", "amperes"],
  v: ["volt", "volts", "vdc"],
  s: ["sec", "secs", "second", "seconds"],
  ms: ["msec", "msecs", "millisecond", "milliseconds"],
  min: ["mins", "minute", "minutes"],
  psi: ["psig", "psi(g)", "lb/in2", "lbf/in2"],
  bar: ["barg", "bar(g)", "bars"],
  kpa: ["kpag", "kpa(g)"],
  "kgf/cm2": ["kg/cm2"],
  "in/min": ["ipm", "inpm", '"/min', "inch/min", "inches/min", "in/minute", "inches/minute"],
  "in/s": ["ips", "in/sec", '"/s', "inches/s", "inches/sec", "inches/second"],
  "mm/min": ["mmpm", "mm/minute", "millimetres/minute", "millimeters/minute"],
  "mm/s": ["mmps", "mm/sec", "mm/second"],
  "cm/min": ["cm/minute"],
  "m/min": ["mpm", "m/minute", "metres/minute", "meters/minute"],
  "m/s": ["m/sec", "m/second"],
  "ft/min": ["fpm", "ft/minute", "feet/minute"],
};

const plain = new Map(Object.entries(spellings).flatMap(([unit, others]) => others.map((other) => [other, unit])));

/** The plainest spelling of a unit as typed; unknown ones come back tidied but as they are. */
export function plainUnit(typed: string): string {
  const tidied = typed.toLowerCase().replace(/[\s.]/g, "").replace(/per/g, "/");
  return plain.get(tidied) ?? tidied;
}

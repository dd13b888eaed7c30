/** How refrigerant was brought out of a system, as the log keeps it; any other line is one too. */
export const RECOVERY_METHODS = ['own-compressor', 'machine-liquid', 'machine-vapor', 'push-pull'] as const

export type RecoveryMethod = typeof RECOVERY_METHODS[number]

/** The methods as people say them. */
export const RECOVERY_METHOD_WORDS: Record<RecoveryMethod, string> = {
  'own-compressor': 'the system’s own compressor',
  'machine-liquid': 'machine, liquid',
  'machine-vapor': 'machine, vapor',
  'push-pull': 'machine, push-pull',
}

/** Whether a line of the log is one of the methods that it knows. */
export function isRecoveryMethod(line: string): line is RecoveryMethod {
  return (RECOVERY_METHODS as readonly string[]).includes(line)
}

/** What to mind before a method is used; null where nothing of its own. Source: common practice, no source. */
export function methodCaution(method: RecoveryMethod): string | null {
  switch (method) {
    case 'push-pull': return 'Only for a large charge of liquid, and only on the scale. Once the siphon runs, it keeps filling even when the machine stops: close the valve at the stop weight. Common practice, no source.'
    case 'own-compressor': return 'Only up to 15 lb of charge, unless it is a pump-out unit fixed to the system (40 CFR 82.156(e)).'
    default: return null
  }
}

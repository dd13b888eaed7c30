/** How refrigerant is brought out of a system, as the log keeps it; any other line is a way too. */
export const RECOVERY_METHODS = ['machine-liquid', 'machine-vapor', 'push-pull', 'own-compressor', 'fixed-pump-out'] as const

export type RecoveryMethod = typeof RECOVERY_METHODS[number]

/** The methods as people say them. */
export const RECOVERY_METHOD_WORDS: Record<RecoveryMethod, string> = {
  'machine-liquid': 'machine, liquid',
  'machine-vapor': 'machine, vapor',
  'push-pull': 'machine, push-pull',
  'own-compressor': 'the system’s own compressor',
  'fixed-pump-out': 'pump-out unit fixed to the system',
}

/** Whether a line of the log is one of the methods that have a name. */
export function isRecoveryMethod(line: string): line is RecoveryMethod {
  return (RECOVERY_METHODS as readonly string[]).includes(line)
}

/** A method as a person reads it; a line of one's own as it was written. */
export function methodWords(line: string): string {
  return isRecoveryMethod(line) ? RECOVERY_METHOD_WORDS[line] : line
}

/**
 * What to mind when a method is used; null where it has nothing of its own.
 *
 * Source: of push-pull common practice, no source; of the system's own compressor 40 CFR 82.156(e).
 */
export function methodCaution(line: string): string | null {
  switch (line) {
    case 'push-pull': return 'For much liquid only, and only on the scale: once its siphon runs it fills on, even when the machine stops. Close the valve at the stop weight.'
    case 'own-compressor': return 'Not for a charge of more than 15 lb, unless it is a pump-out unit fixed to the system (40 CFR 82.156(e)).'
    default: return null
  }
}

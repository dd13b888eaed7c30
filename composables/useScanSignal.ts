import { usePreferencesStore } from '~~/stores/preferences'
import type { StatusKind } from '~~/utils/picture/status'

// One short high tone, two low ones, a rising one, a middle one. Units: hertz, seconds.
const TONES: Record<StatusKind, { hertz: number, from: number, length: number }[]> = {
  ok: [{ hertz: 1320, from: 0, length: 0.09 }],
  att: [{ hertz: 880, from: 0, length: 0.16 }],
  stop: [{ hertz: 260, from: 0, length: 0.18 }, { hertz: 260, from: 0.26, length: 0.18 }],
  unk: [{ hertz: 520, from: 0, length: 0.1 }, { hertz: 780, from: 0.1, length: 0.12 }],
  away: [{ hertz: 880, from: 0, length: 0.16 }],
}
const BUZZES: Record<StatusKind, number[]> = { ok: [40], att: [90], stop: [160, 90, 160], unk: [40, 60, 40], away: [90] }

/** Says with a tone, unless sounds are off on this device, and where it can with a buzz, how a scan came out. */
export function useScanSignal() {
  const preferences = usePreferencesStore()
  let context: AudioContext | null = null

  function signal(kind: StatusKind) {
    navigator.vibrate?.(BUZZES[kind])
    if (!preferences.scanSounds) return
    try {
      context ??= new AudioContext()
      for (const tone of TONES[kind]) play(context, tone)
    }
    catch {
      // A device without sound still shows the answer.
    }
  }

  onBeforeUnmount(() => {
    void context?.close()
  })
  return signal
}

function play(context: AudioContext, { hertz, from, length }: { hertz: number, from: number, length: number }) {
  const start = context.currentTime + from
  const oscillator = context.createOscillator()
  const gain = context.createGain()
  oscillator.frequency.value = hertz
  gain.gain.setValueAtTime(0.15, start)
  gain.gain.exponentialRampToValueAtTime(0.001, start + length)
  oscillator.connect(gain).connect(context.destination)
  oscillator.start(start)
  oscillator.stop(start + length)
}

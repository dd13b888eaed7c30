// What lists of leaked passwords are full of, at the length asked for here: a word of this list padded with figures or
// signs, twice over, or two of them; runs along the keyboard; a short unit repeated. From memory.
const WORDS = new Set(`
  abc admin administrator alexander amanda andrea andrew angel anthony arsenal asdf asdfgh asdfghjkl ashley austin autumn
  baby babygirl bailey banana baseball basketball batman beautiful benjamin blessed brandon brooklyn buster butterfly
  captain changeme charlie cheese chelsea chicken chocolate christian christopher computer cookie corvette cowboy
  cylinder daniel danielle default diamond dolphin dragon eagles elizabeth everton family flower football forever
  freedom friend friends fuckyou gabriel ginger godisgood guest guitar hannah happy hello hockey honda hunter iloveyou
  iloveu internet jackson jasmine jennifer jessica jesus jesuschrist jonathan jordan joshua justin killer lakers letmein
  liverpool login london lovely loveme love lover madison maggie manchester manutd marina master matrix matthew melissa
  mercedes michael michelle minecraft monkey monster mother mustang mylove naruto nicholas nicole ninja nothing orange
  pass passphrase password patrick peanut pepper pokemon princess purple qazwsx qazwsxedc qwerty qwertyuiop rachel
  rainbow ranger recovery refrigerant robert samantha samsung scooter secret service shadow silver simple slipknot
  snoopy soccer softball spiderman spring starwars steelers summer sunshine superman superstar sweet temp temporary test
  testing thomas tigger trustno trustnoone twilight unicorn user vanessa victoria welcome whatever william winter
  yankees yellow zaq zxcvbn zxcvbnm
`.trim().split(/\s+/))

const PHRASES = new Set(['correcthorsebatterystaple', 'tobeornottobe', 'thequickbrownfox', 'maytheforcebewithyou', 'letmeinplease', 'opensesame'])

const RUNS = [
  '01234567890123456789', 'abcdefghijklmnopqrstuvwxyz', 'qwertyuiop', 'asdfghjkl', 'zxcvbnm', '1q2w3e4r5t6y7u8i9o0p',
  '1qaz2wsx3edc4rfv5tgb6yhn7ujm', 'qazwsxedcrfvtgbyhnujm', 'q1w2e3r4t5y6u7i8o9p0', '!@#$%^&*()',
]

const LOOKALIKES: Record<string, string> = { '@': 'a', '4': 'a', '3': 'e', '1': 'i', '!': 'i', '0': 'o', '5': 's', '$': 's', '7': 't' }

/** A run shorter than this says nothing. */
const SHORTEST_RUN = 3
const LONGEST_UNIT = 4

/** Whether a password, in lower case, is one that is tried first. */
export function isCommonPassword(plain: string): boolean {
  if (isRepeated(plain) || isMadeOfRuns(plain)) return true
  return [plain, deciphered(plain)].some((text) => {
    const letters = text.replace(/[^a-z]/g, '')
    return PHRASES.has(letters) || isWords(withoutPadding(text)) || isWords(letters)
  })
}

/** One unit of up to four characters over and over, as 'abcabcabcabc'. */
function isRepeated(text: string): boolean {
  for (let length = 1; length <= LONGEST_UNIT; length++) {
    if (text === text.slice(0, length).repeat(Math.ceil(text.length / length)).slice(0, text.length)) return true
  }
  return false
}

function isMadeOfRuns(text: string): boolean {
  let rest = text
  while (rest.length >= SHORTEST_RUN) {
    const length = runAtStart(rest)
    if (length < SHORTEST_RUN) return false
    rest = rest.slice(length)
  }
  return true
}

function runAtStart(text: string): number {
  let longest = 0
  for (const run of RUNS) {
    for (const line of [run, [...run].reverse().join('')]) {
      for (let length = text.length; length > longest; length--) {
        if (line.includes(text.slice(0, length))) longest = length
      }
    }
  }
  return longest
}

/** At most two words of the list, one after the other. */
function isWords(text: string): boolean {
  if (WORDS.has(text)) return true
  for (let cut = 2; cut <= text.length - 2; cut++) {
    if (WORDS.has(text.slice(0, cut)) && WORDS.has(text.slice(cut))) return true
  }
  return false
}

function withoutPadding(text: string): string {
  return text.replace(/^[^a-z]+|[^a-z]+$/g, '')
}

function deciphered(text: string): string {
  return [...withoutPadding(text.replace(/[\d!?.#*]+$/, ''))].map(character => LOOKALIKES[character] ?? character).join('')
}

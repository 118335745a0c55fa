/**
 * Words that guessing programs try first, alone, doubled, with digits or with letters swapped
 * for look-alikes. Only passwords made of nothing else are refused: a phrase of several words
 * passes.
 */
const OBVIOUS_WORDS = new Set(
  (
    'password passwort contrasena passphrase letmein welcome bienvenido admin administrator ' +
    'changeme default secret qwerty qwertyuiop qwertz azerty asdfgh asdfghjkl zxcvbn zxcvbnm ' +
    'abc abcd abcde abcdef abcdefg abcdefgh abcdefghi abcdefghij iloveyou teamo monkey dragon ' +
    'football baseball basketball soccer futbol sunshine princess princesa master shadow ' +
    'superman batman starwars trustno trustnoone hello hola login signin guest test testing ' +
    'user username access freedom whatever jesus michael jordan summer winter spring autumn ' +
    'monday friday january december america mexico texas concrete cement hormigon concreto ' +
    'strikeoff flatwork readymix foreman bookkeeper owner company office boss money dinero ' +
    'computer internet samsung android iphone google charlie harley hunter ranger killer ' +
    'pepper ginger cookie flower purple orange yellow silver golden diamond mustang ferrari ' +
    'liverpool chelsea arsenal barcelona cowboys steelers eagles yankees lakers'
  ).split(' '),
);

const LOOK_ALIKES: Readonly<Record<string, string>> = {
  '0': 'o',
  '1': 'i',
  '3': 'e',
  '4': 'a',
  '5': 's',
  '7': 't',
  '@': 'a',
  $: 's',
  '!': 'i',
};

/**
 * Whether a password is among the first that anyone would try: an obvious word with trimmings,
 * one character or a run repeated, or the person's own address, name or company.
 */
export function isObviousPassword(password: string, about: readonly string[]): boolean {
  const lower = password.toLowerCase();
  if (new Set(lower).size < 4) return true;
  if (isRun(lower)) return true;
  const letters = lettersOf(lower);
  const core = lower.replace(/^\P{L}+|\P{L}+$/gu, '');
  const readAsWords = lettersOf([...core].map((c) => LOOK_ALIKES[c] ?? c).join(''));
  if (isObviousWord(letters) || isObviousWord(readAsWords)) return true;
  return about.some((text) => {
    const own = [text.toLowerCase(), text.toLowerCase().split('@')[0] ?? ''];
    return own.some((word) => lower === word || (letters !== '' && letters === lettersOf(word)));
  });
}

function lettersOf(text: string): string {
  return text.replace(/\P{L}/gu, '');
}

function isObviousWord(letters: string): boolean {
  if (letters === '') return false;
  for (let length = 3; length <= letters.length; length += 1) {
    if (letters.length % length !== 0) continue;
    const word = letters.slice(0, length);
    if (OBVIOUS_WORDS.has(word) && word.repeat(letters.length / length) === letters) return true;
  }
  return false;
}

/** "1234567890", "9876543210", "abcdefghij": every step the same. */
function isRun(text: string): boolean {
  const codes = [...text].map((c) => (c === '0' ? 0x3a : (c.codePointAt(0) ?? 0)));
  const steps = new Set(codes.slice(1).map((code, i) => code - (codes[i] ?? 0)));
  return steps.size === 1;
}

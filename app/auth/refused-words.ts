/**
 * What a password must not be built from, in small letters: the product, its trade, and words that come first in any list
 * of guesses. A password may contain them; it must not be little else.
 */
export const refusedWords: readonly string[] = [
  'cannulary',
  ...[
    'tracheostomy',
    'tracheotomy',
    'tracheal',
    'trachea',
    'cannula',
    'suction',
    'hospital',
    'nurse',
    'nursing',
    'doctor',
  ],
  ...['patient', 'ward', 'clinic', 'therapist', 'specialist', 'medical', 'health', 'airway', 'shift', 'night'],
  ...['password', 'passwort', 'passphrase', 'passcode', 'passw0rd', 'p4ssw0rd', 'pa55word', 'pass', 'secret', 'login'],
  ...['welcome', 'changeme', 'letmein', 'admin', 'administrator', 'user', 'guest', 'default', 'temp', 'test', 'demo'],
  ...[
    'qwertyuiop',
    'qwerty',
    'qwertz',
    'azerty',
    'asdfghjkl',
    'asdfgh',
    'asdf',
    'zxcvbnm',
    'zxcvbn',
    'yxcvbnm',
    '1q2w3e4r5t',
  ],
  ...['1q2w3e4r', '1qaz2wsx', 'qazwsx', 'q1w2e3r4', 'abc', 'monkey', 'dragon', 'football', 'baseball', 'sunshine'],
  ...['princess', 'superman', 'batman', 'iloveyou', 'love', 'master', 'shadow', 'trustno1', 'computer', 'internet'],
  ...['january', 'february', 'march', 'april', 'may', 'june', 'july', 'august', 'september', 'october', 'november'],
  ...['december', 'monday', 'tuesday', 'wednesday', 'thursday', 'friday', 'saturday', 'sunday', 'spring', 'summer'],
  ...['autumn', 'winter', 'morning', 'evening', 'london', 'sydney', 'newyork', 'berlin', 'zurich', 'please', 'hello'],
]

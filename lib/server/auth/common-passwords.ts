/**
 * Stems that lists of leaked passwords are full of. A password is refused when nothing of substance is left
 * once these, digits and punctuation are taken away: length alone does not save "password1234".
 * Common practice (NIST SP 800-63B 5.1.1.2 asks for a list and leaves its contents open).
 */
const stems = [
  "password", "passwort", "passw0rd", "p@ssword", "p@ssw0rd", "passphrase", "letmein", "welcome", "qwertyuiop", "qwerty",
  "asdfghjkl", "asdfgh", "zxcvbnm", "zxcvbn", "1q2w3e4r", "1qaz2wsx", "qazwsx", "iloveyou", "administrator", "admin",
  "monkey", "dragon", "sunshine", "princess", "football", "baseball", "liverpool", "arsenal", "chelsea", "everton",
  "rangers", "celtic", "manchester", "london", "england", "scotland", "superman", "batman", "pokemon", "master",
  "shadow", "michael", "charlie", "thomas", "jordan", "trustno1", "trustno", "whatever", "computer", "internet",
  "secret", "changeme", "default", "guest", "login", "hello", "freedom", "starwars", "flower", "summer", "winter",
  "spring", "autumn", "monday", "friday", "electrician", "electrical", "electric", "sealwire", "charger", "chargepoint",
  "abcdefghijkl", "abcdefgh", "abcdef", "abcd", "abc", "the", "my", "is", "test", "user",
] as const; // prettier-ignore

const longestFirst = [...stems].sort((a, b) => b.length - a.length);

/** True when the text is made of common stems, digits, punctuation or one character over and over. */
export function isCommonPassword(password: string): boolean {
  let left = password.toLowerCase();
  for (const stem of longestFirst) left = left.replaceAll(stem, "");
  const letters = left.replace(/[^\p{L}]/gu, "");
  const distinct = new Set(password.toLowerCase()).size;
  return distinct < 5 || letters.length < 3;
}

/** True when the text holds the person's own name or the first part of their address. */
export function holdsOwnName(password: string, email: string, name: string): boolean {
  const lower = password.toLowerCase();
  const parts = [email.split("@")[0] ?? "", name.replace(/\s+/g, "")].map((part) => part.toLowerCase());
  return parts.some((part) => part.length >= 4 && lower.replace(/\s+/g, "").includes(part));
}

/** A name of the product's own as a page says it: "sign-in-refused" reads "Sign in refused". */
export function sentenceCase(name: string): string {
  const words = name.replaceAll('-', ' ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}

/** @module The message for a word that is no command. */
export async function unknownCommand(word: string, commands: readonly { readonly name: string }[]): Promise<string> {
  const { series } = await import('./rooms.js');
  const names = commands.map((command) => command.name);
  const near = series.nearest(word, names);
  const hint = near === undefined ? `wanted one of ${names.join(', ')}` : `did you mean ${near}?`;
  return `"${word}" is no command; ${hint}`;
}

/** @module Completion scripts. All words stand in the script, so that a key press does not start the program. */
import type { CommandWords, Vocabulary } from './vocabulary.js';

const single = (text: string): string => `'${text.replaceAll("'", String.raw`'\''`)}'`;
const words = (list: readonly string[]): string => list.join(' ');

/** Options with a value from a fixed set of names. */
const valueCases = (values: Vocabulary['values'], line: (option: string, names: readonly string[]) => string): string =>
  Object.entries(values)
    .map(([option, names]) => line(option, names))
    .join('\n');

const withValue = ({ options }: CommandWords): string[] =>
  options.filter(({ takesValue }) => takesValue).map(({ name }) => `--${name}`);

function bash({ commands, values }: Vocabulary): string {
  const all = [...new Set(commands.flatMap(withValue))];
  return `# leastterm completion for bash: eval "$(leastterm completion bash)"
_leastterm() {
  local word="\${COMP_WORDS[COMP_CWORD]}" before="\${COMP_WORDS[COMP_CWORD-1]}" command='' i
  for ((i = 1; i < COMP_CWORD; i++)); do
    case "\${COMP_WORDS[i]}" in
      -*) ;;
      *) command="\${COMP_WORDS[i]}"; break ;;
    esac
  done
  COMPREPLY=()
  case "$before" in
${valueCases(values, (option, names) => `    --${option}) COMPREPLY=($(compgen -W ${single(words(names))} -- "$word")); return ;;`)}
    ${[...all.filter((option) => !(option.slice(2) in values)), '-o'].join('|')}) COMPREPLY=($(compgen -f -- "$word")); return ;;
  esac
  case "$command" in
    '') COMPREPLY=($(compgen -W ${single(`${words(commands.map(({ name }) => name))} --help --version`)} -- "$word")) ;;
${commands
  .map(({ name, options, operands }) => {
    const flags = words(options.map((option) => `--${option.name}`));
    return `    ${name})
      if [[ "$word" == -* ]]; then COMPREPLY=($(compgen -W ${single(flags)} -- "$word"))
      else COMPREPLY=($(compgen -W ${single(words(operands))} -- "$word") $(compgen -f -- "$word")); fi ;;`;
  })
  .join('\n')}
  esac
}
complete -o filenames -F _leastterm leastterm
`;
}

/** Text of a description in a zsh specification: brackets and colons mean something there. */
const zshText = (text: string): string => text.replace(/[[\]:\\]/g, String.raw`\$&`);

function zsh({ commands, values }: Vocabulary): string {
  const action = (name: string): string =>
    values[name] === undefined ? '_files' : `(${words(values[name].map(zshText))})`;
  const body = commands.map(({ name, options, operands }) => {
    const specs = options.map((option) =>
      single(
        `--${option.name}[${zshText(option.help)}]${option.takesValue ? `:${option.name}:${action(option.name)}` : ''}`,
      ),
    );
    const operand =
      operands.length === 0 ? single('*:file:_files') : single(`*:operand:{ compadd -- ${words(operands)}; _files }`);
    return `    ${name}) _arguments ${[...specs, operand].join(' ')} ;;`;
  });
  return `#compdef leastterm
# leastterm completion for zsh: eval "$(leastterm completion zsh)", or a file _leastterm in $fpath
_leastterm() {
  local -a commands
  commands=(
${commands.map(({ name, summary }) => `    ${single(`${name}:${zshText(summary)}`)}`).join('\n')}
  )
  if (( CURRENT == 2 )); then _describe command commands; return; fi
  local command="\${words[2]}"
  shift words
  (( CURRENT-- ))
  case "$command" in
${body.join('\n')}
  esac
}
if [[ "$funcstack[1]" == _leastterm ]]; then _leastterm "$@"; else compdef _leastterm leastterm; fi
`;
}

function fish({ commands, values }: Vocabulary): string {
  const lines = [
    '# leastterm completion for fish: leastterm completion fish | source',
    'complete -c leastterm -f',
    'complete -c leastterm -n __fish_use_subcommand -l help -d "show the help"',
    'complete -c leastterm -n __fish_use_subcommand -l version -d "show the version"',
  ];
  for (const { name, summary, options, operands } of commands) {
    lines.push(`complete -c leastterm -n __fish_use_subcommand -a ${name} -d ${single(summary)}`);
    const there = `-n ${single(`__fish_seen_subcommand_from ${name}`)}`;
    if (operands.length > 0) lines.push(`complete -c leastterm ${there} -F -a ${single(words(operands))}`);
    for (const option of options) {
      const names = values[option.name];
      const value = !option.takesValue ? '' : names === undefined ? ' -r -F' : ` -x -a ${single(words(names))}`;
      lines.push(`complete -c leastterm ${there} -l ${option.name} -d ${single(option.help)}${value}`);
    }
  }
  return `${lines.join('\n')}\n`;
}

export const COMPLETIONS: Readonly<Record<string, (vocabulary: Vocabulary) => string>> = { bash, zsh, fish };

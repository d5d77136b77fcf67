import type { Fault } from '../values/result.ts';

const placeOf = ({ path, line, column }: Fault): string => {
  if (line !== undefined) return `line ${line}${column === undefined ? '' : `, column ${column}`}: `;
  return path === undefined || path === '$' ? '' : `${path}: `;
};

/** Whether a sentence already says it. */
const said = (message: string, text: string): boolean => message.includes(text);

/** A fault on one line or two for a terminal: where, what, and what was found and is allowed where the sentence leaves it out. */
export const faultLines = (fault: Fault): readonly string[] => {
  const { message, found, allowed } = fault;
  const further = [
    ...(found === undefined || said(message, found) ? [] : [`found ${found}`]),
    ...(allowed === undefined || said(message, allowed) ? [] : [`allowed: ${allowed}`]),
  ].join('; ');
  return [`${placeOf(fault)}${message}`, ...(further === '' ? [] : [`  ${further}`])];
};

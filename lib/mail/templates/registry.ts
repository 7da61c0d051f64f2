import type { Message } from '../letter';
import { invitation } from './invitation';
import { passwordReset } from './password-reset';

/** Every message Quadrel sends, by its name. */
const templates = {
  invitation,
  'password-reset': passwordReset,
};

export type TemplateName = keyof typeof templates;
export type PropsOf<Name extends TemplateName> = Parameters<(typeof templates)[Name]>[0];

/** Writes a message from its template. */
export function compose<Name extends TemplateName>(name: Name, props: PropsOf<Name>): Message {
  // Name and props belong together by the signature; a table of functions cannot be called by a type parameter otherwise.
  const template = templates[name] as (props: PropsOf<Name>) => Message;
  return template(props);
}

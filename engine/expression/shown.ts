import type { Element } from './element';
import type { Condition } from './statement';
import { conditionText, elementText } from './to-text';

/** A text as a message quotes it: cut short when it is long. */
const shortened = (text: string): string => (text.length <= 60 ? text : `${text.slice(0, 57)}…`);

export const shownElement = (element: Element): string => shortened(elementText(element));

export const shownCondition = (condition: Condition): string => shortened(conditionText(condition));

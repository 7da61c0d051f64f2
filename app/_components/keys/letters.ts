import { stored } from '../theme/stored';

/** Single letters can be turned off (WCAG 2.1.4); the choice is kept in this browser. */
export const letters = stored('quadrel.letters', ['on', 'off'], 'on');

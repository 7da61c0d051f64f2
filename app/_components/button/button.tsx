'use client';

import type { ComponentProps } from 'react';
import { Tip } from './tip';

interface Props extends Omit<ComponentProps<'button'>, 'type'> {
  kind?: 'primary' | 'outlined' | 'plain';
  type?: 'button' | 'submit';
  /** The single letter (or keys) that does the same, shown in the tooltip. */
  keyName?: string;
  /** What the tooltip says; without it and without a key there is none. */
  tip?: string;
  tipSide?: 'left' | 'right';
  /** Why it cannot be used now. It stays reachable, and its tooltip gives the reason. */
  unavailable?: string;
  wide?: boolean;
}

const looks = { primary: 'btn primary', outlined: 'btn', plain: 'plain' };

/** Clay (at most one a page), outlined, or underlined. */
export function Button(props: Props) {
  const {
    kind = 'outlined',
    keyName,
    tip,
    tipSide,
    unavailable,
    wide = false,
    className = '',
    onClick,
    ...rest
  } = props;
  const text = unavailable ?? tip;
  const button = (describedBy?: string) => (
    <button
      type="button"
      {...rest}
      className={`${looks[kind]} ${wide ? 'wide' : ''} ${className}`}
      aria-disabled={unavailable === undefined ? undefined : true}
      aria-describedby={describedBy}
      aria-keyshortcuts={unavailable === undefined ? keyName : undefined}
      onClick={unavailable === undefined ? onClick : (event) => event.preventDefault()}
    />
  );
  if (text === undefined) return button();
  return (
    <Tip text={text} keyName={unavailable === undefined ? keyName : undefined} side={tipSide} wide={wide}>
      {button}
    </Tip>
  );
}

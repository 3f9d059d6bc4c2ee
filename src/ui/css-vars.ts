// Custom properties in a style attribute, typed: `style={cssVars({ '--split': '40%' })}`.
import type { CSSProperties } from 'react';

type Variables = CSSProperties & Readonly<Record<`--${string}`, string | number>>;

export const cssVars = (variables: Variables): CSSProperties => variables;

import { StyleSheet, Text as NativeText } from 'react-native';

import { color, type, type ColorName } from '../theme/tokens';
import { RichInline } from './RichText';
import { web } from './webProps';

export interface HeadingProps {
  text: string;
  level: 1 | 2 | 3 | 4;
  /** look, where it differs from the level */
  kind?: 'h1' | 'h2' | 'h3' | 'answer' | 'strong' | 'trailHead';
  tone?: ColorName;
  id?: string;
  /** focus can be moved here by the page (after a change of route, or to an error summary) */
  focusable?: boolean;
}

export function Heading({ text, level, kind, tone = 'ink', id, focusable }: HeadingProps) {
  const look = kind ?? (level === 1 ? 'h1' : level === 2 ? 'h2' : 'h3');
  return (
    <NativeText id={id} role="heading" {...web({ 'aria-level': level, tabIndex: focusable ? -1 : undefined })} style={[styles[look], { color: color[tone] }]}>
      <RichInline text={text} />
    </NativeText>
  );
}

const styles = StyleSheet.create(type);

import { useEffect } from 'react';
import { StyleSheet, View } from 'react-native';

import { helpText } from '@/shared/text/help';

import { size, space } from '../theme/tokens';
import { Card } from '../ui/Card';
import { LinkButton } from '../ui/LinkButton';
import { RichText } from '../ui/RichText';
import { Screen, Stack } from '../ui/Screen';

/** The one help page; a link from elsewhere names its part after the #. */
export function HelpScreen() {
  useEffect(() => {
    document.getElementById(window.location.hash.slice(1))?.scrollIntoView();
  }, []);
  return (
    <Screen title={helpText.title} actions={<LinkButton grow={1} href="/help/glossary" label={helpText.toGlossary} />}>
      <View style={styles.text}>
        <Stack>
          {helpText.parts.map((part) => (
            <View key={part.id} id={part.id}>
              <Card title={part.title}>
                <View style={styles.sentences}>{part.sentences.map((sentence) => <RichText key={sentence} text={sentence} />)}</View>
              </Card>
            </View>
          ))}
        </Stack>
      </View>
    </Screen>
  );
}

const styles = StyleSheet.create({ text: { maxWidth: size.text + 2 * space.lg }, sentences: { gap: space.md } });

import type { ReactNode } from 'react';
import { Span, Text } from '../ui/Text';
import type { TextSize } from '../theme/typography';

/** A species' name in Lora italic, never abbreviated. `end` follows in the interface's face: a specimen's code. */
export function Binomial({ name, size = 'body', end }: { name: string; size?: TextSize; end?: ReactNode }) {
  return (
    <Text size={size}>
      <BinomialSpan name={name} />
      {end ? <> {end}</> : null}
    </Text>
  );
}

const notItalic = /^(cf\.|sp\.|spp\.|aff\.|subsp\.|×|x)$/;

/** The same inside a sentence; qualifiers such as "cf." and "sp." stay upright. */
export function BinomialSpan({ name }: { name: string }) {
  const words = name.split(' ');
  return (
    <>
      {words.map((word, index) => (
        <Span key={`${index}${word}`} science italic={!notItalic.test(word)}>
          {word}
          {index < words.length - 1 ? ' ' : ''}
        </Span>
      ))}
    </>
  );
}

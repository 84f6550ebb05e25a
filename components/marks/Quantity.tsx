import { formatQuantity, type QuantityKind } from '../../shared/domain/quantityText';
import type { QuantityName, Tone } from '../theme/tokens';
import type { TextSize } from '../theme/typography';
import { Element } from '../ui/Element';
import { Span, Text } from '../ui/Text';

interface QuantityProps {
  value: number | null;
  error?: number | null;
  kind: QuantityKind;
  unit?: string;
  /** Colour of the number: its quantity's, or ink for densities. */
  tone?: QuantityName | 'ink';
  size?: TextSize;
  /** Counted on one side and doubled: the sign ×2. */
  doubled?: boolean;
  /** Words where there is no value. */
  missing?: string;
}

/** A measured number: value in its quantity's colour, error and unit soft; digits set by the error. Copying gives the plain number. */
export function Quantity({ value, error = null, kind, unit = '', tone = 'ink', size = 'table', doubled, missing = '–' }: QuantityProps) {
  const text = formatQuantity({ value, error, unit, kind });
  if (!text) {
    return (
      <Text size={size} tone="inkSoft">
        {missing}
      </Text>
    );
  }
  const bracket = text.power !== null && text.error !== null;
  const numberTone: Tone = tone;
  return (
    <Element as="span" attributes={{ onCopy: copyPlain(text.plain) }} css={{ whiteSpace: 'nowrap' }}>
      <Text size={size} tone="inkSoft" nowrap>
        {bracket ? '(' : ''}
        <Span tone={numberTone} weight="semibold">
          {text.value}
        </Span>
        {text.error === null ? '' : ` ± ${text.error}`}
        {bracket ? ')' : ''}
        {text.power === null ? null : <Span tone={numberTone}> × {text.power}</Span>}
        {text.unit === '' ? '' : ` ${text.unit}`}
        {doubled ? <Span tone="ink"> ×2</Span> : null}
      </Text>
    </Element>
  );
}

interface CopyEvent {
  clipboardData: { setData: (type: string, data: string) => void };
  preventDefault: () => void;
}

function copyPlain(plain: string) {
  return (event: CopyEvent) => {
    event.clipboardData.setData('text/plain', plain);
    event.preventDefault();
  };
}

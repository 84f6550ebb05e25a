import { useState } from 'react';
import { View } from 'react-native';
import { errorInWords } from '../queries/errorInWords';
import { useProposeTaxon, useTaxa } from '../queries/taxa';
import { Button } from '../ui/Button';
import { Row } from '../ui/Row';
import { Section } from '../ui/Section';
import { Select } from '../ui/Select';
import { Text } from '../ui/Text';
import { SearchField, TextField } from '../ui/TextField';

const ranks = ['species', 'genus', 'family', 'suborder', 'order', 'superorder', 'class'].map((rank) => ({ value: rank, label: rank }));

/** A new node: name, rank, the node it lies in, and after whom. A curator's own is accepted at once. */
export function NewTaxon() {
  const propose = useProposeTaxon();
  const [name, setName] = useState('');
  const [rank, setRank] = useState('species');
  const [parentText, setParentText] = useState('');
  const [parent, setParent] = useState('');
  const [authority, setAuthority] = useState('');
  const parents = useTaxa({ query: parentText, status: 'accepted' }, parentText.trim().length > 1);
  const options = (parents.data?.items ?? []).filter((taxon) => taxon.rank !== 'species').map((taxon) => ({ value: taxon.slug, label: `${taxon.name}, ${taxon.rank}` }));
  const save = () => propose.mutate({ name, rank, parent, authority }, { onSuccess: () => (setName(''), setAuthority('')) });
  return (
    <Section title="New taxon">
      <View style={{ gap: 12, paddingTop: 12, maxWidth: 480 }}>
        <TextField label="Name" value={name} onChangeText={setName} maxLength={120} required />
        <Select label="Rank" value={rank} options={ranks} onChange={setRank} />
        <SearchField label="Find the node it lies in" placeholder="lies in: genus, family, order" value={parentText} onChangeText={setParentText} />
        <Select label="Lies in" value={options.some((option) => option.value === parent) ? parent : ''} placeholder={options.length > 0 ? 'choose' : 'search above first'} options={options} onChange={setParent} disabled={options.length === 0} />
        <TextField label="After" value={authority} onChangeText={setAuthority} maxLength={400} hint="The checklist or paper that this place is taken from." />
        <Row>
          <Button kind="primary" label="Add the taxon" disabled={name.trim().length < 3 || parent === ''} working={propose.isPending} onPress={save} />
        </Row>
        {propose.isSuccess ? (
          <Text role="status" tone="settled">
            {`${propose.data.name} is ${propose.data.status}.`}
          </Text>
        ) : null}
        {propose.error ? (
          <Text role="alert" tone="flagged">
            {errorInWords(propose.error).text}
          </Text>
        ) : null}
      </View>
    </Section>
  );
}

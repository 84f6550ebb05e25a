import { useState } from 'react';
import type { Taxon } from '../../../shared/contracts/register';
import { useAccount } from '../../queries/account';
import { errorInWords, fieldErrorsOf } from '../../queries/errorInWords';
import { useProposeTaxon, useTaxa } from '../../queries/taxa';
import { Button } from '../../ui/Button';
import { Checkbox } from '../../ui/Checkbox';
import { Sheet } from '../../ui/Dialog';
import { Hint } from '../../ui/Hint';
import { Select } from '../../ui/Select';
import { Text } from '../../ui/Text';
import { TextField } from '../../ui/TextField';

/** Proposes a species that the register does not know yet; a curator accepts it. */
export function ProposeSpecies({ startName, onClose, onProposed }: { startName: string; onClose: () => void; onProposed: (taxon: Taxon) => void }) {
  const { demo } = useAccount();
  const [name, setName] = useState(startName);
  const [above, setAbove] = useState('');
  const [parent, setParent] = useState('');
  const [authority, setAuthority] = useState('');
  const [demonstration, setDemonstration] = useState(demo);
  const [tried, setTried] = useState(false);
  const propose = useProposeTaxon();
  const parents = useTaxa({ query: above.trim(), status: 'accepted' }, above.trim().length > 1);
  const options = (parents.data?.items ?? []).filter((taxon) => taxon.rank !== 'species').map((taxon) => ({ value: taxon.slug, label: `${taxon.name} (${taxon.rank})` }));
  const errors = fieldErrorsOf(propose.error);
  const at = (path: string) => errors.find((error) => error.path === path || error.path.endsWith(`.${path}`))?.message;
  const send = () => {
    setTried(true);
    if (name.trim() === '' || parent === '') return;
    propose.mutate({ name: name.trim(), rank: 'species', parent, authority: authority.trim(), demonstration }, { onSuccess: onProposed });
  };
  return (
    <Sheet open title="Propose a species" closeLabel="Close" onClose={onClose} foot={<Button kind="primary" label="Send the proposal" working={propose.isPending} onPress={send} />}>
      <TextField label="Name of the species" value={name} onChangeText={setName} maxLength={120} hint="Genus and species, or the genus and sp." error={at('name') ?? (tried && name.trim() === '' ? 'Give the name.' : undefined)} />
      <TextField label="Search the taxon above it" value={above} onChangeText={setAbove} hint="A genus, family or order of the register." autoComplete="off" />
      <Select label="Taxon above it" value={parent} options={options} placeholder={options.length === 0 ? 'Search first' : 'Choose'} onChange={setParent} error={at('parent') ?? (tried && parent === '' ? 'Choose the taxon that it stands below.' : undefined)} />
      <TextField label="Authority" value={authority} onChangeText={setAuthority} maxLength={400} hint="Author and year, or the checklist that names it." error={at('authority')} />
      {demo ? <Checkbox label="Invented, for demonstration" checked={demonstration} onChange={setDemonstration} error={at('demonstration')} /> : null}
      {propose.error && errors.length === 0 ? (
        <Text role="alert" size="secondary" tone="flagged">
          {errorInWords(propose.error).text}
        </Text>
      ) : null}
      <Hint>A curator looks at the proposal. Until it is accepted you can go on entering, and submit afterwards.</Hint>
    </Sheet>
  );
}

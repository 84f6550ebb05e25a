import type { VersionPage } from '../../shared/contracts/versions';
import { groupThousands } from '../../shared/domain/quantityText';
import { shortChecksum } from '../marks/VersionStamp';
import { bundleHref, fileHref } from '../queries/versions';
import { Section } from '../ui/Section';
import { Table, type TableColumn } from '../ui/Table';
import { Text } from '../ui/Text';
import { TextLink } from '../ui/TextLink';

type File = VersionPage['files'][number];

const columns = (label: string): TableColumn<File>[] => [
  { key: 'name', head: 'file', cell: (file) => <TextLink href={fileHref(label, file.name) as '/'} outside size="table">{file.name}</TextLink> },
  { key: 'rows', head: 'rows', align: 'end', phone: 'hide', cell: (file) => <Text size="secondary" tone="inkSoft">{file.rows === null ? '' : String(file.rows)}</Text> },
  { key: 'bytes', head: 'bytes', align: 'end', nowrap: true, cell: (file) => <Text size="secondary">{groupThousands(String(file.bytes))}</Text> },
  { key: 'sha', head: 'SHA-256', align: 'end', nowrap: true, cell: (file) => <Text size="secondary" tone="inkSoft">{shortChecksum(file.sha256)}</Text> },
];

/** The files of a version, each by itself or all in one archive. */
export function VersionFiles({ page }: { page: VersionPage }) {
  const bytes = page.files.reduce((sum, file) => sum + file.bytes, 0);
  return (
    <Section title="Files" bare end={<TextLink href={bundleHref(page.label) as '/'} outside size="secondary">{`all as zip, ${groupThousands(String(Math.round(bytes / 1000)))} kB`}</TextLink>}>
      <Table caption={`Files of version ${page.label}`} rows={page.files} columns={columns(page.label)} rowKey={(file) => file.name} dense phoneLayout="table" />
    </Section>
  );
}

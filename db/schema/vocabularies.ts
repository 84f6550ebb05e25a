import { sql } from 'drizzle-orm';
import {
  type AnyPgColumn,
  boolean,
  check,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  smallint,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { overlapKinds } from '../../shared/contracts/vocabulary';
import { users } from './auth';
import { createdAt, id, updatedAt, wordsIn } from './columns';
import { labs } from './people';

/** Nodes of the classification, species included. A clade is any node, keyed by the path of names from the root. */
export const taxa = pgTable(
  'taxa',
  {
    id: id(),
    parentId: uuid('parent_id').references((): AnyPgColumn => taxa.id),
    rank: text('rank').notNull(),
    name: text('name').notNull(),
    /** Permanent address. */
    slug: text('slug').notNull().unique(),
    /** Names from the root, joined by ` > `; the key of a clade. */
    path: text('path').notNull().unique(),
    commonNames: text('common_names').array().notNull().default(sql`'{}'`),
    /** Where this node's place in the classification is taken from. */
    authority: text('authority').notNull().default(''),
    /** False for a name kept at genus level or one that fits several species: it enters no fit. */
    named: boolean('named').notNull().default(true),
    demonstration: boolean('demonstration').notNull().default(false),
    status: text('status').notNull().default('accepted'),
    proposedBy: uuid('proposed_by').references(() => users.id),
    decidedBy: uuid('decided_by').references(() => users.id),
    createdAt: createdAt(),
    updatedAt: updatedAt(),
  },
  (t) => [
    check('taxa_status', sql`${t.status} in ('proposed', 'accepted', 'refused')`),
    check('taxa_slug', sql`${t.slug} ~ '^[a-z0-9]+(-[a-z0-9]+)*$'`),
    index('taxa_parent').on(t.parentId),
    index('taxa_path').using('btree', t.path.op('text_pattern_ops')),
  ],
);

/** Former and alternative names; their addresses lead on to the taxon. */
export const taxonSynonyms = pgTable(
  'taxon_synonyms',
  {
    id: id(),
    taxonId: uuid('taxon_id').notNull().references(() => taxa.id),
    name: text('name').notNull(),
    slug: text('slug').notNull().unique(),
    reason: text('reason').notNull().default(''),
    createdAt: createdAt(),
  },
  (t) => [index('taxon_synonyms_taxon').on(t.taxonId)],
);

export const taxonIdentifiers = pgTable(
  'taxon_identifiers',
  {
    taxonId: uuid('taxon_id').notNull().references(() => taxa.id),
    authority: text('authority').notNull(),
    identifier: text('identifier').notNull(),
  },
  (t) => [primaryKey({ columns: [t.taxonId, t.authority] })],
);

/** Structures: a partonomy per class of animals. */
export const structures = pgTable(
  'structures',
  {
    id: id(),
    key: text('key').notNull().unique(),
    name: text('name').notNull(),
    parentId: uuid('parent_id').references((): AnyPgColumn => structures.id),
    /** Class of animals in which this partonomy holds (`Mammalia`, `Aves`), or null for every class. */
    animalClass: text('animal_class'),
    /** A structure on the midline cannot be doubled. */
    midline: boolean('midline').notNull().default(false),
    /** Defined as what is left of the whole when the named parts are taken away. */
    byComplement: boolean('by_complement').notNull().default(false),
    position: smallint('position').notNull().default(0),
    status: text('status').notNull().default('accepted'),
    createdAt: createdAt(),
  },
  (t) => [check('structures_key', sql`${t.key} ~ '^[a-z][a-z0-9_]*$'`), check('structures_status', sql`${t.status} in ('accepted', 'retired')`)],
);

/** What a structure includes and excludes, versioned: values of two definition versions are never pooled. */
export const structureDefinitions = pgTable(
  'structure_definitions',
  {
    id: id(),
    structureId: uuid('structure_id').notNull().references(() => structures.id),
    version: integer('version').notNull(),
    includes: text('includes').array().notNull().default(sql`'{}'`),
    excludes: text('excludes').array().notNull().default(sql`'{}'`),
    note: text('note').notNull().default(''),
    uberonId: text('uberon_id'),
    uberonMatch: text('uberon_match'),
    createdAt: createdAt(),
  },
  (t) => [
    unique('structure_definitions_version').on(t.structureId, t.version),
    check('structure_definitions_match', sql`${t.uberonMatch} is null or ${t.uberonMatch} in ('exact', 'close', 'broad')`),
    check('structure_definitions_positive', sql`${t.version} > 0`),
  ],
);

export const delineationCriteria = pgTable('delineation_criteria', {
  key: text('key').primaryKey(),
  name: text('name').notNull(),
  note: text('note').notNull().default(''),
  position: smallint('position').notNull().default(0),
});

/** A publication, or one lab's own specimens. */
export const sources = pgTable(
  'sources',
  {
    id: id(),
    key: text('key').notNull().unique(),
    kind: text('kind').notNull(),
    citation: text('citation').notNull(),
    doi: text('doi'),
    year: integer('year'),
    labId: uuid('lab_id').references(() => labs.id),
    /** Carrier of the values where it is not the paper itself (a package, a later table). */
    carrier: text('carrier').notNull().default(''),
    licence: text('licence').notNull().default(''),
    demonstration: boolean('demonstration').notNull().default(false),
    createdAt: createdAt(),
  },
  (t) => [check('sources_kind', sql`${t.kind} in ('publication', 'lab')`)],
);

export const sourceOverlaps = pgTable(
  'source_overlaps',
  {
    sourceId: uuid('source_id').notNull().references(() => sources.id),
    otherSourceId: uuid('other_source_id').notNull().references(() => sources.id),
    overlap: text('overlap').notNull(),
    note: text('note').notNull().default(''),
  },
  (t) => [
    primaryKey({ columns: [t.sourceId, t.otherSourceId] }),
    check('source_overlaps_kind', wordsIn('overlap', overlapKinds)),
    check('source_overlaps_two', sql`${t.sourceId} <> ${t.otherSourceId}`),
  ],
);

export const trees = pgTable('trees', {
  id: id(),
  name: text('name').notNull().unique(),
  newick: text('newick').notNull(),
  tips: integer('tips').notNull(),
  dated: boolean('dated').notNull().default(false),
  sourceId: uuid('source_id').references(() => sources.id),
  match: jsonb('match'),
  uploadedBy: uuid('uploaded_by').references(() => users.id),
  createdAt: createdAt(),
});

// A shop's own names for boats, matched to hulls of the catalog.
import * as z from 'zod';
import { Ref } from './fit.ts';

const Name = z.string().trim().min(1).max(160);

export const NameToResolve = z
  .strictObject({
    ref: Ref.optional(),
    name: Name,
    maker: z.string().trim().min(1).max(80).optional().describe('Where it is known apart from the name.'),
    year: z.int().min(1900).max(2100).optional().describe('Model year; one that stands in the name is found by itself.'),
  })
  .meta({ id: 'NameToResolve' });
export type NameToResolve = z.infer<typeof NameToResolve>;

export const ResolveOrder = z
  .strictObject({
    names: z
      .array(z.union([Name, NameToResolve]))
      .min(1)
      .max(1000),
    candidates: z.int().min(1).max(10).default(3).describe('At most so many a name.'),
  })
  .meta({ id: 'ResolveOrder' });
export type ResolveOrder = z.infer<typeof ResolveOrder>;

export const Candidate = z
  .strictObject({
    id: z.string(),
    maker: z.string(),
    model: z.string(),
    package: z.string().nullable(),
    yearFrom: z.int().nullable(),
    yearTo: z.int().nullable(),
    score: z.number().min(0).max(1).describe('1 where every word and the year agree.'),
    why: z.array(z.string()).describe('What agrees and what does not, in words.'),
  })
  .meta({ id: 'Candidate' });
export type Candidate = z.infer<typeof Candidate>;

export const ResolvedName = z
  .strictObject({
    ref: Ref.optional(),
    name: z.string(),
    best: z.string().nullable().describe('Id of the one candidate that can be taken without asking; null where a person should look.'),
    candidates: z.array(Candidate),
  })
  .meta({ id: 'ResolvedName' });
export type ResolvedName = z.infer<typeof ResolvedName>;

export const ResolveReply = z.strictObject({ data: z.array(ResolvedName), edition: z.int().nonnegative() }).meta({ id: 'ResolveReply' });

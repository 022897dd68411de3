import { z } from 'zod';

/** A UUIDv7, the id of every row. */
export const id = z.uuid();

/** A moment with zone, ISO 8601. */
export const timestamp = z.iso.datetime({ offset: true });

/** The address name of a workspace: `kiln-lane`. */
export const slug = z
  .string()
  .regex(/^[a-z0-9](?:[a-z0-9-]{0,46}[a-z0-9])?$/, 'Use small letters, digits and single hyphens.');

/** 32 random bytes, base64url: share links, invitations. */
export const secretToken = z.string().regex(/^[A-Za-z0-9_-]{43}$/, 'This link is not complete.');

/** Page of a list, as asked. */
export const pageQuery = z.object({
  page: z.coerce.number().int().min(1).max(100_000).default(1),
  pageSize: z.coerce.number().int().min(1).max(100).default(50),
});
export type PageQuery = z.infer<typeof pageQuery>;

/** Page of a list, as answered. */
export const pageOf = <T extends z.ZodType>(item: T) =>
  z.object({
    items: z.array(item),
    page: z.number().int(),
    pageSize: z.number().int(),
    total: z.number().int(),
  });

/** Who did something, as others in the workspace may see them. */
export const personSummary = z.object({
  id,
  name: z.string(),
  /** One to three letters for the round badge. */
  initials: z.string(),
});
export type PersonSummary = z.infer<typeof personSummary>;

/** What the server answers when nothing needs to be said. */
export const done = z.object({ ok: z.literal(true) });

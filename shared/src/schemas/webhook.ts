// Webhooks by the Standard Webhooks specification.
import * as z from 'zod';

export const webhookTopics = ['edition.published', 'hull.changed', 'hull.superseded', 'correction.decided'] as const;
export const WebhookTopic = z
  .enum(webhookTopics)
  .describe(
    'edition.published: the catalog has a new edition. hull.changed, hull.superseded: one hull; left out one by one where an edition changes more than 500. correction.decided: one of the account’s own corrections.',
  )
  .meta({ id: 'WebhookTopic' });
export type WebhookTopic = z.infer<typeof WebhookTopic>;

const Url = z.url({ protocol: /^https?$/ }).max(2000);
const Name = z.string().trim().min(1).max(80);
const Topics = z.array(WebhookTopic).min(1).max(webhookTopics.length);

export const NewWebhook = z.strictObject({ url: Url, name: Name, topics: Topics }).meta({ id: 'NewWebhook' });
export type NewWebhook = z.infer<typeof NewWebhook>;

export const WebhookChange = z
  .strictObject({
    url: Url.optional(),
    name: Name.optional(),
    topics: Topics.optional(),
    enabled: z.boolean().optional().describe('true takes up again a webhook that was disabled.'),
  })
  .meta({ id: 'WebhookChange' });
export type WebhookChange = z.infer<typeof WebhookChange>;

export const Webhook = z
  .strictObject({
    id: z.string(),
    url: z.string(),
    name: z.string(),
    topics: z.array(WebhookTopic),
    disabledAt: z.iso.datetime().nullable(),
    disabledWhy: z.string().nullable(),
    previousUntil: z.iso.datetime().nullable().describe('Until then deliveries are signed with the secret before the last rotation too.'),
    revision: z.int().positive(),
    createdAt: z.iso.datetime(),
  })
  .meta({ id: 'Webhook' });
export type Webhook = z.infer<typeof Webhook>;

export const CreatedWebhook = Webhook.extend({ secret: z.string().describe('`whsec_…`, shown once.') }).meta({ id: 'CreatedWebhook' });
export type CreatedWebhook = z.infer<typeof CreatedWebhook>;

export const Delivery = z
  .strictObject({
    id: z.string(),
    messageId: z.string().describe('The `webhook-id` header; the same for every try.'),
    topic: z.string(),
    status: z.enum(['waiting', 'sending', 'delivered', 'failed']),
    tries: z.int().nonnegative(),
    nextTryAt: z.iso.datetime().nullable(),
    lastTryAt: z.iso.datetime().nullable(),
    lastStatus: z.int().nullable().describe('HTTP status of the last answer; null where none came.'),
    lastError: z.string().nullable(),
    lastMs: z.int().nullable(),
    body: z.string().describe('What is sent, byte for byte.'),
    createdAt: z.iso.datetime(),
  })
  .meta({ id: 'Delivery' });
export type Delivery = z.infer<typeof Delivery>;

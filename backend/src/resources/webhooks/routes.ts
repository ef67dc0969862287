import { Rotation } from '@tiltwright/shared/schemas/account.ts';
import { CreatedWebhook, Delivery, NewWebhook, Webhook, WebhookChange } from '@tiltwright/shared/schemas/webhook.ts';
import * as z from 'zod';
import { actorId } from '../../auth/actor.ts';
import type { Deps } from '../../deps.ts';
import { decodeIdCursor, listOf, pageById, pageFields } from '../../http/cursor.ts';
import { answeredFromCache, demandMatch } from '../../http/etag.ts';
import { noStore, type Route, revalidate, route } from '../../http/operation.ts';
import { changeWebhook, createWebhook, removeWebhook, replayDelivery, rotateSecret, sendTest } from './keep-webhook.ts';
import { deliveryOrProblem, hookOrProblem, hookTag, listDeliveries, listHooks, toDelivery, toWebhook } from './queries.ts';

const tag = 'Webhooks';
const may = 'webhooks.own';
const hookParams = z.strictObject({ id: z.string().min(1).max(80) });

export function webhookRoutes({ db, config }: Deps): Route[] {
  return [
    route(
      {
        id: 'listWebhooks',
        method: 'get',
        path: '/me/webhooks',
        tag,
        summary: 'The account’s webhooks',
        may,
        reply: { status: 200, description: 'The webhooks without their secrets.', schema: listOf(Webhook) },
        cache: noStore,
      },
      ({ actor }) => ({ data: listHooks(db, actorId(actor)).map(toWebhook), next: null }),
    ),
    route(
      {
        id: 'createWebhook',
        method: 'post',
        path: '/me/webhooks',
        tag,
        summary: 'Be told of what happens',
        description:
          'Messages follow the Standard Webhooks specification: `webhook-id`, `webhook-timestamp` and `webhook-signature` (v1, HMAC-SHA256). Any answer of 200 to 299 within five seconds counts as received; else it is tried again for some three days, then the webhook is disabled and its owner told by mail. Redirects are not followed; addresses of private networks are refused.',
        may,
        body: NewWebhook,
        bodyExample: { url: 'https://shop.example/tiltwright', name: 'Stock', topics: ['edition.published'] },
        reply: { status: 201, description: 'The webhook; its secret is shown once.', schema: CreatedWebhook },
        problems: ['wrong-state'],
        repeat: 'refuse',
        cache: noStore,
      },
      ({ actor, body }) => createWebhook(db, config, actorId(actor), body),
    ),
    route(
      {
        id: 'getWebhook',
        method: 'get',
        path: '/me/webhooks/{id}',
        tag,
        summary: 'One webhook',
        may,
        params: hookParams,
        reply: { status: 200, description: 'The webhook.', schema: Webhook },
        problems: ['not-found'],
        etag: true,
        cache: `private, ${revalidate}`,
      },
      ({ actor, params, req, res }) => {
        const row = hookOrProblem(db, actorId(actor), params.id);
        return answeredFromCache(req, res, hookTag(row)) ? undefined : toWebhook(row);
      },
    ),
    route(
      {
        id: 'changeWebhook',
        method: 'patch',
        path: '/me/webhooks/{id}',
        tag,
        summary: 'Change a webhook, or take a disabled one up again',
        may,
        params: hookParams,
        body: WebhookChange,
        bodyExample: { enabled: true },
        reply: { status: 200, description: 'The webhook as it is now.', schema: Webhook },
        problems: ['not-found'],
        etag: true,
        cache: noStore,
      },
      ({ actor, params, body, req, res }) => {
        const row = changeWebhook(db, config, actorId(actor), params.id, body, (before) => demandMatch(req, hookTag(before)));
        res.setHeader('ETag', `"${hookTag(row)}"`);
        return toWebhook(row);
      },
    ),
    route(
      {
        id: 'deleteWebhook',
        method: 'delete',
        path: '/me/webhooks/{id}',
        tag,
        summary: 'Delete a webhook and its delivery log',
        may,
        params: hookParams,
        reply: { status: 204, description: 'It is gone.' },
        problems: ['not-found'],
        etag: true,
        cache: noStore,
      },
      ({ actor, params, req }) => removeWebhook(db, actorId(actor), params.id, (row) => demandMatch(req, hookTag(row))),
    ),
    route(
      {
        id: 'rotateWebhookSecret',
        method: 'post',
        path: '/me/webhooks/{id}/rotate',
        tag,
        summary: 'Give a webhook a new secret',
        description: 'For the overlap each delivery carries both signatures.',
        may,
        params: hookParams,
        body: Rotation,
        bodyExample: { overlapHours: 24 },
        reply: { status: 200, description: 'The webhook with its new secret, shown once.', schema: CreatedWebhook },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ actor, params, body }) => rotateSecret(db, actorId(actor), params.id, body.overlapHours),
    ),
    route(
      {
        id: 'testWebhook',
        method: 'post',
        path: '/me/webhooks/{id}/test',
        tag,
        summary: 'Send a message of the type webhook.test',
        may,
        params: hookParams,
        reply: { status: 202, description: 'Its delivery; how it went is in the delivery log.', schema: Delivery },
        problems: ['not-found', 'wrong-state'],
        cache: noStore,
      },
      ({ actor, params }) => toDelivery(sendTest(db, hookOrProblem(db, actorId(actor), params.id))),
    ),
    route(
      {
        id: 'listDeliveries',
        method: 'get',
        path: '/me/webhooks/{id}/deliveries',
        tag,
        summary: 'What a webhook was sent, newest first',
        may,
        params: hookParams,
        query: z.strictObject(pageFields),
        reply: { status: 200, description: 'A page of deliveries.', schema: listOf(Delivery) },
        problems: ['not-found'],
        cache: noStore,
      },
      ({ actor, params, query }) => {
        const { id } = hookOrProblem(db, actorId(actor), params.id);
        const rows = listDeliveries(db, id, query.limit + 1, decodeIdCursor(query.cursor));
        return pageById(rows.map(toDelivery), query.limit);
      },
    ),
    route(
      {
        id: 'replayDelivery',
        method: 'post',
        path: '/me/webhooks/{id}/deliveries/{delivery}/replay',
        tag,
        summary: 'Send a delivery once more',
        description: 'The same message under the same `webhook-id`.',
        may,
        params: hookParams.extend({ delivery: z.string().min(1).max(80) }),
        reply: { status: 202, description: 'The delivery, on its way again.', schema: Delivery },
        problems: ['not-found', 'wrong-state'],
        cache: noStore,
      },
      ({ actor, params }) => {
        const hook = hookOrProblem(db, actorId(actor), params.id);
        return toDelivery(replayDelivery(db, hook, deliveryOrProblem(db, hook.id, params.delivery)));
      },
    ),
  ];
}

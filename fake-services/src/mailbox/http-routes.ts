import type { IncomingMessage, ServerResponse } from 'node:http';
import { findAsset } from './assets.js';
import type { Control } from './control.js';
import { answer, answerJson, HttpError } from './http-answers.js';
import { toMailView } from './mail-types.js';
import type { StoredMail } from './mail-types.js';
import { filterFromQuery } from './message-filter.js';
import type { MessageStore } from './message-store.js';
import { mailsPerPage } from './page-lists.js';
import { renderPage } from './page.js';
import { readJson } from './read-json.js';

export interface Surroundings {
  store: MessageStore;
  control: Control;
  /** Address of this server, no slash at its end. */
  httpUrl: string;
  smtpUrl: string;
}

type Handler = (url: URL, around: Surroundings, request: IncomingMessage, response: ServerResponse) => unknown;

/** Answers one request. @throws HttpError, FilterError, ScenarioError for what cannot be done */
export async function route(
  url: URL,
  around: Surroundings,
  request: IncomingMessage,
  response: ServerResponse,
): Promise<void> {
  const methods = routes.find(([path]) => path.test(url.pathname))?.[1];
  if (!methods) return answerAsset(url, response);
  const method = request.method === 'HEAD' ? 'GET' : (request.method ?? '');
  const handler = methods[method];
  if (!handler) {
    response.setHeader('allow', Object.keys(methods).join(', '));
    throw new HttpError(405, 'method-not-allowed', `${url.pathname} takes ${Object.keys(methods).join(' or ')} only.`);
  }
  await handler(url, around, request, response);
}

const routes: [RegExp, Record<string, Handler>][] = [
  [/^\/$/, { GET: showPage }],
  [/^\/api\/health$/, { GET: (_url, _around, _request, response) => answerJson(response, 200, { ok: true }) }],
  [/^\/api\/summary$/, { GET: summarize }],
  [/^\/api\/messages$/, { GET: listMessages, DELETE: deleteMessages }],
  [/^\/api\/messages\/[^/]+$/, { GET: getMessage }],
  [/^\/api\/messages\/[^/]+\/raw$/, { GET: getRaw }],
  [/^\/api\/control$/, { GET: getControl, POST: setControl }],
];

function showPage(
  url: URL,
  { store, control, smtpUrl }: Surroundings,
  _request: IncomingMessage,
  response: ServerResponse,
) {
  const id = url.searchParams.get('id');
  const limit = Number(url.searchParams.get('limit'));
  const request = {
    to: url.searchParams.get('to')?.toLowerCase() ?? null,
    id,
    limit: Number.isInteger(limit) && limit > 0 ? limit : mailsPerPage,
  };
  const page = renderPage({ mails: store.list(), request, scenario: control.scenario, smtpUrl });
  answer(response, id !== null && !store.find(id) ? 404 : 200, 'text/html; charset=utf-8', page);
}

function summarize(_url: URL, { store }: Surroundings, _request: IncomingMessage, response: ServerResponse) {
  const mails = store.list();
  answerJson(response, 200, { count: mails.length, newest: mails[0]?.envelope.id ?? null });
}

function listMessages(url: URL, { store, httpUrl }: Surroundings, _request: IncomingMessage, response: ServerResponse) {
  const mails = store.list(filterFromQuery(url.searchParams));
  answerJson(response, 200, { messages: mails.map((mail) => toMailView(mail, httpUrl)) });
}

async function deleteMessages(_url: URL, { store }: Surroundings, _request: IncomingMessage, response: ServerResponse) {
  answerJson(response, 200, { deleted: await store.clear() });
}

function getMessage(url: URL, { store, httpUrl }: Surroundings, _request: IncomingMessage, response: ServerResponse) {
  answerJson(response, 200, toMailView(getMail(url, store), httpUrl));
}

async function getRaw(url: URL, { store }: Surroundings, _request: IncomingMessage, response: ServerResponse) {
  const raw = await store.findRaw(getMail(url, store).envelope.id);
  // As plain text, so that a browser shows it instead of saving it.
  if (raw) answer(response, 200, 'text/plain; charset=utf-8', raw);
}

function getMail(url: URL, store: MessageStore): StoredMail {
  const mail = store.find(url.pathname.split('/')[3] ?? '');
  if (!mail) throw new HttpError(404, 'not-found', 'There is no such email: it was deleted, or the id is mistyped.');
  return mail;
}

function getControl(_url: URL, { control }: Surroundings, _request: IncomingMessage, response: ServerResponse) {
  answerJson(response, 200, control.scenario);
}

async function setControl(_url: URL, { control }: Surroundings, request: IncomingMessage, response: ServerResponse) {
  answerJson(response, 200, control.set(await readJson(request)));
}

async function answerAsset(url: URL, response: ServerResponse): Promise<void> {
  const asset = await findAsset(url.pathname);
  if (!asset) throw new HttpError(404, 'not-found', `There is nothing at ${url.pathname}.`);
  answer(response, 200, asset.contentType, asset.body);
}

import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import type { ReadableStream } from 'node:stream/web';
import Busboy, { type BusboyInstance } from '@fastify/busboy';
import { log } from '../log.ts';
import { FilesAway, type FileStore, type Received } from './store.ts';

/** Why a form with a file was not taken; `status` is the HTTP status that says so. */
export class UploadFault extends Error {
	constructor(
		readonly status: 400 | 413 | 415 | 503,
		readonly code: 'malformed' | 'file-missing' | 'too-large' | 'not-multipart' | 'files-away',
		message: string,
	) {
		super(message);
	}
}

export interface ReceivedForm {
	fields: Record<string, string>;
	file: Received;
	/** the last part of the name it was sent under, without control characters */
	fileName: string;
}

const fieldLimits = {
	fields: 40,
	fieldSize: 10_000,
	fieldNameSize: 100,
	files: 1,
	headerPairs: 100,
};

/**
 * Reads a multipart form as it arrives, its one file straight to the store, so that memory does not grow
 * with the file. Only a field called `file` is a file; a later one is passed over. Whoever gets the answer
 * must keep or discard the file; when this rejects, nothing was left behind.
 */
export async function receiveForm(
	request: Request,
	store: FileStore,
	maxBytes: number,
): Promise<ReceivedForm> {
	const type = request.headers.get('content-type') ?? '';
	if (!/^multipart\/form-data\s*;/i.test(type) || !request.body) {
		throw new UploadFault(415, 'not-multipart', 'send the file as multipart/form-data');
	}
	const declared = Number(request.headers.get('content-length') ?? 0);
	if (declared > maxBytes + 1_000_000) throw tooLarge(maxBytes);
	const source = Readable.fromWeb(request.body as ReadableStream);
	return collect(parser(type, maxBytes), source, store, maxBytes);
}

const tooLarge = (maxBytes: number) =>
	new UploadFault(
		413,
		'too-large',
		`the file is larger than the limit of ${sizeInWords(maxBytes)}`,
	);

export const sizeInWords = (bytes: number): string =>
	bytes >= 1e9
		? `${Number((bytes / 1e9).toPrecision(3))} GB`
		: `${Number((bytes / 1e6).toPrecision(3))} MB`;

function parser(type: string, maxBytes: number): BusboyInstance {
	try {
		const headers = { 'content-type': type };
		return new Busboy({ headers, limits: { ...fieldLimits, fileSize: maxBytes } });
	} catch (cause) {
		throw Object.assign(malformed('the form has no boundary'), { cause });
	}
}

/** A promise for a fault that may come; a parser whose file goes nowhere any more never ends by itself. */
function rejection(): { promise: Promise<never>; reject: (problem: Error) => void } {
	let reject: (problem: Error) => void = unheard;
	const promise = new Promise<never>((_, fail) => (reject = fail));
	promise.catch(unheard);
	return { promise, reject };
}

/** Whether it was the store that failed: a service away, a disk full. */
const isOfStore = (problem: unknown): problem is Error =>
	problem instanceof FilesAway || (problem instanceof Error && 'syscall' in problem);

function faultOf(error: unknown): Error {
	if (error instanceof UploadFault) return error;
	if (error instanceof FilesAway) return awayFault(error);
	return isOfStore(error) ? error : malformed('the upload broke off');
}

const awayFault = ({ message, detail }: FilesAway) => {
	log.error({ detail }, 'the store of files is away');
	return new UploadFault(503, 'files-away', message);
};

const malformed = (message: string) => new UploadFault(400, 'malformed', message);

/** The first fault of a form rejects the pipeline; those that follow from it must not end the process. */
const unheard = () => undefined;

async function collect(
	busboy: BusboyInstance,
	source: Readable,
	store: FileStore,
	maxBytes: number,
): Promise<ReceivedForm> {
	const fields: Record<string, string> = {};
	let arriving: { stream: Readable; received: Promise<Received>; name: string } | undefined;
	const failed = rejection();
	busboy.on('error', unheard);
	source.on('error', unheard);
	busboy.on('field', (name, value) => {
		fields[name] = value;
	});
	busboy.on('file', (field, stream, name) => {
		if (field !== 'file' || arriving) return void stream.resume();
		stream.on('error', unheard);
		stream.once('limit', () => source.destroy(tooLarge(maxBytes)));
		const received = store.receive(stream);
		// looked at below, once the whole form is in; but nobody goes on sending to a store that has failed
		received.catch((problem: unknown) => {
			if (isOfStore(problem)) failed.reject(problem);
		});
		arriving = { stream, received, name: cleanFileName(name) };
	});
	const parsed = pipeline(source, busboy);
	parsed.catch(unheard);
	try {
		await Promise.race([parsed, failed.promise]);
	} catch (error) {
		const fault = faultOf(error);
		source.destroy();
		arriving?.stream.destroy(fault);
		await arriving?.received.then(
			(file) => file.discard(),
			() => undefined,
		);
		throw fault === error ? fault : Object.assign(fault, { cause: error });
	}
	const file = await arriving?.received.catch((problem: unknown) => {
		throw isOfStore(problem) ? faultOf(problem) : problem;
	});
	if (!file || !arriving) throw new UploadFault(400, 'file-missing', 'no file was sent');
	return { fields, file, fileName: arriving.name };
}

/** Names go into pages, rows and headers, never into paths; this keeps them readable there. */
export function cleanFileName(name: string | undefined): string {
	const last = (name ?? '').split(/[/\\]/).at(-1) ?? '';
	const plain = last.replace(/[\p{Cc}\p{Cf}\p{Co}\p{Cn}]/gu, '').trim();
	return plain.slice(0, 200) || 'unnamed';
}

import { randomBytes } from "node:crypto";
import type { Readable } from "node:stream";
import {
  DeleteObjectCommand,
  GetObjectCommand,
  HeadObjectCommand,
  PutObjectCommand,
  S3Client,
  S3ServiceException,
} from "@aws-sdk/client-s3";
import { getSignedUrl } from "@aws-sdk/s3-request-presigner";
import { type Env, env } from "./env.server.ts";

/** What a browser needs to send a file by itself: PUT the file to the address with exactly these headers. */
export interface PresignedPut {
  url: string;
  headers: Record<string, string>;
}

export interface StoredFile {
  bytes: number;
  contentType: string;
}

export interface StoredStream extends StoredFile {
  body: ReadableStream<Uint8Array>;
}

/** Files by key. Nothing here says who may see them: whoever hands one out has asked that first. */
export interface Storage {
  /** An address to which a browser may PUT one file of this type and size, for a while. The store may not insist: check what arrived. */
  presignPut(key: string, file: StoredFile, expiresInS?: number): Promise<PresignedPut>;
  /** What is kept under a key, or null. */
  head(key: string): Promise<StoredFile | null>;
  /** The bytes under a key, or null. @throws FileTooLargeError before more than maxBytes are held. */
  read(key: string, maxBytes: number): Promise<Uint8Array | null>;
  /** The file under a key to be passed on as it comes, or null. */
  stream(key: string): Promise<StoredStream | null>;
  put(key: string, body: Uint8Array, contentType: string): Promise<void>;
  /** Deletes; a key that is not there is no error. */
  delete(key: string): Promise<void>;
  close(): void;
}

export class FileTooLargeError extends Error {
  override name = "FileTooLargeError";
}

/** A key that cannot be guessed, such as "photos/3f…": 160 random bits after the folder. */
export function newStorageKey(folder: string, extension = ""): string {
  return `${folder}/${randomBytes(20).toString("hex")}${extension && `.${extension}`}`;
}

type StorageSettings = Pick<
  Env,
  | "S3_ENDPOINT"
  | "S3_PUBLIC_ENDPOINT"
  | "S3_REGION"
  | "S3_BUCKET"
  | "S3_ACCESS_KEY_ID"
  | "S3_SECRET_ACCESS_KEY"
  | "S3_FORCE_PATH_STYLE"
>;

/** A bucket of any S3. Connects on first use. */
export function createStorage(settings: StorageSettings): Storage {
  const client = s3Client(settings, settings.S3_ENDPOINT);
  // Only signs: the address it signs is the one that a browser reaches.
  const signer = s3Client(settings, settings.S3_PUBLIC_ENDPOINT);
  const Bucket = settings.S3_BUCKET;

  async function open(Key: string) {
    const answer = await orNull(client.send(new GetObjectCommand({ Bucket, Key })));
    if (!answer?.Body) return null;
    return { body: answer.Body as Readable & { transformToWebStream(): ReadableStream }, ...described(answer) };
  }

  return {
    async presignPut(Key, file, expiresInS = 600) {
      const command = new PutObjectCommand({ Bucket, Key, ContentType: file.contentType, ContentLength: file.bytes });
      const signableHeaders = new Set(["host", "content-type", "content-length"]);
      const url = await getSignedUrl(signer, command, { expiresIn: expiresInS, signableHeaders });
      // The browser sets Content-Length itself, from the file.
      return { url, headers: { "Content-Type": file.contentType } };
    },
    async head(Key) {
      const answer = await orNull(client.send(new HeadObjectCommand({ Bucket, Key })));
      return answer && described(answer);
    },
    async read(key, maxBytes) {
      const file = await open(key);
      return file && readAtMost(file.body, maxBytes);
    },
    async stream(key) {
      const file = await open(key);
      return file && { ...file, body: file.body.transformToWebStream() };
    },
    async put(Key, Body, ContentType) {
      await client.send(new PutObjectCommand({ Bucket, Key, Body, ContentType, ContentLength: Body.byteLength }));
    },
    async delete(Key) {
      await client.send(new DeleteObjectCommand({ Bucket, Key }));
    },
    close() {
      client.destroy();
      signer.destroy();
    },
  };
}

let storage: Storage | undefined;

/** The file store of this process, made on first use from the settings. */
export function appStorage(): Storage {
  storage ??= createStorage(env());
  return storage;
}

function s3Client(settings: StorageSettings, endpoint: string): S3Client {
  return new S3Client({
    endpoint,
    region: settings.S3_REGION,
    forcePathStyle: settings.S3_FORCE_PATH_STYLE,
    credentials: { accessKeyId: settings.S3_ACCESS_KEY_ID, secretAccessKey: settings.S3_SECRET_ACCESS_KEY },
    // Otherwise the SDK signs the checksum of an empty body into a presigned PUT, and not every S3 knows the header.
    requestChecksumCalculation: "WHEN_REQUIRED",
    responseChecksumValidation: "WHEN_REQUIRED",
  });
}

function described(answer: { ContentLength?: number; ContentType?: string }): StoredFile {
  return { bytes: answer.ContentLength ?? 0, contentType: answer.ContentType ?? "application/octet-stream" };
}

async function orNull<T>(answer: Promise<T>): Promise<T | null> {
  try {
    return await answer;
  } catch (error) {
    if (error instanceof S3ServiceException && error.$metadata.httpStatusCode === 404) return null;
    throw error;
  }
}

async function readAtMost(body: Readable, maxBytes: number): Promise<Uint8Array> {
  const parts: Uint8Array[] = [];
  let bytes = 0;
  for await (const part of body as AsyncIterable<Uint8Array>) {
    bytes += part.byteLength;
    // Leaving the loop ends the download.
    if (bytes > maxBytes) throw new FileTooLargeError(`more than ${maxBytes} bytes`);
    parts.push(part);
  }
  return Buffer.concat(parts);
}

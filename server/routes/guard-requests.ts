import express, { type Request, type RequestHandler } from "express";
import { foreignOrigin, unsupportedType } from "../problems.ts";

const changesNothing = ({ method }: Request) => ["GET", "HEAD", "OPTIONS"].includes(method);

const hasBody = ({ headers }: Request) =>
  headers["transfer-encoding"] !== undefined || Number(headers["content-length"] ?? 0) > 0;

/** Answers of the API are for the one who asked, now; opened in a browser, they may do nothing. */
export const guardAnswers: RequestHandler = (_request, response, next) => {
  response.set({
    "Cache-Control": "no-store",
    "Content-Security-Policy": "default-src 'none'; frame-ancestors 'none'; sandbox",
  });
  next();
};

/** Whatever changes something must say that it comes from our own pages. */
export const requireOwnOrigin =
  (publicOrigin: string): RequestHandler =>
  (request, _response, next) => {
    if (!changesNothing(request) && request.headers.origin !== publicOrigin) throw foreignOrigin();
    next();
  };

/** JSON only: a foreign page can send forms and plain text without asking the browser first. */
export const requireJson: RequestHandler = (request, _response, next) => {
  if (!changesNothing(request) && hasBody(request) && !request.is("application/json"))
    throw unsupportedType();
  next();
};

export const readJson = express.json({ limit: "2mb", type: () => true });

/**
 * An answer in Stripe's error shape. It is thrown inside an API call and turned into a reply at one place, because
 * a call can be refused at any depth and the answer is then always the same kind of thing.
 */
export class ApiError extends Error {
  readonly status: number;
  readonly body: { error: ApiErrorBody };

  constructor(status: number, error: ApiErrorBody) {
    super(error.message);
    this.status = status;
    this.body = { error };
  }
}

export type ApiErrorBody = {
  type: "invalid_request_error" | "idempotency_error" | "api_error";
  message: string;
  code?: string;
  param?: string;
};

export function invalidRequest(message: string, detail: { code?: string; param?: string } = {}): ApiError {
  return new ApiError(400, { type: "invalid_request_error", message, ...detail });
}

export function noSuch(kind: string, id: string, param: string): ApiError {
  return new ApiError(404, {
    type: "invalid_request_error",
    code: "resource_missing",
    message: `No such ${kind}: '${id}'`,
    param,
  });
}

export function unauthorized(message: string): ApiError {
  return new ApiError(401, { type: "invalid_request_error", message });
}

export function idempotencyMisuse(key: string): ApiError {
  return new ApiError(400, {
    type: "idempotency_error",
    message:
      "Keys for idempotent requests can only be used with the same parameters they were first used with. " +
      `Try using a key other than '${key}' if you meant to execute a different request.`,
  });
}

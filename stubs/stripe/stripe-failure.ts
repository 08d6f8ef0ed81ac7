/** An answer other than success, in the words and codes of Stripe's error object. */
export class StripeFailure extends Error {
  constructor(
    readonly status: number,
    readonly type: 'api_error' | 'card_error' | 'idempotency_error' | 'invalid_request_error',
    message: string,
    readonly details: { readonly code?: string; readonly param?: string } = {},
  ) {
    super(message);
  }

  toJSON(): object {
    return { error: { type: this.type, message: this.message, ...this.details } };
  }
}

/** 400 for a request that Stripe itself would refuse. */
export function badRequest(message: string, param?: string, code?: string): StripeFailure {
  return new StripeFailure(400, 'invalid_request_error', message, { code, param });
}

/** 404 for an id that is not there. */
export function noSuch(kind: string, id: string, param = 'id'): StripeFailure {
  return new StripeFailure(404, 'invalid_request_error', `No such ${kind}: '${id}'`, {
    code: 'resource_missing',
    param,
  });
}

/** 501 for what Stripe does and this stub does not; `param` names it. */
export function notInStub(param: string, what = `the parameter ${param}`): StripeFailure {
  return new StripeFailure(501, 'api_error', `The local stub of Stripe does not do ${what}.`, {
    code: 'not_in_stub',
    param,
  });
}

// Made from console.json by `npm run openapi`.
export interface paths {
    "/api/sign-up": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Ask for an account; a mail with a link to confirm the address goes out, whether or not it has one */
        post: operations["SignUp"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/sign-up/confirm": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Open the account by the link that was mailed; signing in comes after */
        post: operations["ConfirmSignUp"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/session": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** Who is signed in; `stale`: refresh the session first */
        get: operations["SessionState"];
        put?: never;
        /** Sign in */
        post: operations["SignIn"];
        /** Sign out; also by an access token whose minutes are over */
        delete: operations["SignOut"];
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/session/refresh": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Go on with the session; each refresh token is good for one use, and a second use ends the session */
        post: operations["RefreshSession"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/password-reset": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Ask for a link to set a new password; a mail goes out, whether or not the address has an account */
        post: operations["AskForPassword"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/password-reset/confirm": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Set a new password by the link that was mailed; ends all sessions, and signs nobody in */
        post: operations["SetPassword"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/me": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** The account, its plan, and how much of this month is used */
        get: operations["Me"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        /** Change the name or the units of measure */
        patch: operations["ChangeMe"];
        trace?: never;
    };
    "/api/me/roles": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        /** Choose the roles anew; admin is neither chosen nor lost here */
        put: operations["SetRoles"];
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/me/password": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Change the password; ends the other sessions */
        post: operations["ChangePassword"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/me/email": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Ask for another address; it holds when the link that is mailed there is used */
        post: operations["ChangeEmail"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/email-change/confirm": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Confirm a new address by the link that was mailed there */
        post: operations["ConfirmEmail"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/me/export": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** Everything that the service knows of the account, as a file */
        get: operations["ExportData"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/me/events": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** What happened to the account, the latest first, a page at a time */
        get: operations["ListEvents"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/me/close": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Close the account for good: keys are revoked, what is personal is removed */
        post: operations["CloseAccount"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/sessions": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** The sessions that have not ended */
        get: operations["ListSessions"];
        put?: never;
        post?: never;
        /** End all sessions but this one */
        delete: operations["EndOtherSessions"];
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/sessions/{id}": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        post?: never;
        /** End one session */
        delete: operations["EndSession"];
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/keys": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** The keys of the account, the newest first */
        get: operations["ListKeys"];
        put?: never;
        /** Make a server key, shown whole in this answer alone; takes an Idempotency-Key */
        post: operations["MakeKey"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/keys/{id}": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** One key */
        get: operations["ReadKey"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        /** Rename a key, or give it other scopes, another cap or another expiry */
        patch: operations["ChangeKey"];
        trace?: never;
    };
    "/api/keys/{id}/rotate": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Make the key that takes another’s place; without grace the old one ends at once, and the password is asked for */
        post: operations["RotateKey"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/keys/{id}/revoke": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** End a key for good; doing it again changes nothing */
        post: operations["RevokeKey"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/keys/{id}/claim": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Generate a key that an administrator issued to you: once, shown whole in this answer alone */
        post: operations["ClaimKey"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/keys/{id}/pass": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** A bearer for the try page: ten minutes, from the console’s pages only, charged to this key */
        post: operations["GivePass"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/keys/{id}/log": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** The recent calls of a key, the latest first, a page at a time */
        get: operations["ReadKeyLog"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/usage": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** Calls and units by day (UTC), calculator, key and class of status, and the month’s pace */
        get: operations["ReadUsage"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/plan": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** The plan, what is left of the month, the other plans, and what was asked for */
        get: operations["ReadPlan"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/plan/requests": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Ask for another plan, with a reason; an administrator answers */
        post: operations["AskForPlan"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/plan/requests/{id}": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        post?: never;
        /** Take a wish back that has no answer yet */
        delete: operations["WithdrawPlanRequest"];
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/kit": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** The gear of the account; version 0 where nothing was kept yet */
        get: operations["ReadKit"];
        /** Keep the gear of the account, as changed from a version */
        put: operations["KeepKit"];
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/saved": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** Saved recipes and evenings, the latest first */
        get: operations["ListSaved"];
        put?: never;
        /** Save a recipe’s or an evening’s question under a name */
        post: operations["Save"];
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/saved/{id}": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** One saved thing */
        get: operations["ReadSaved"];
        put?: never;
        post?: never;
        /** Remove a saved thing for good, and its link with it */
        delete: operations["DropSaved"];
        options?: never;
        head?: never;
        /** Rename a saved thing, or put another question in its place, as changed from a version */
        patch: operations["ChangeSaved"];
        trace?: never;
    };
    "/api/saved/{id}/link": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        get?: never;
        put?: never;
        /** Let whoever has the link read this; asking again gives the same link */
        post: operations["Share"];
        /** Make the link worthless; a later one is another */
        delete: operations["Unshare"];
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
    "/api/shared/{token}": {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        /** What stands behind a link, without whose it is */
        get: operations["ReadShared"];
        put?: never;
        post?: never;
        delete?: never;
        options?: never;
        head?: never;
        patch?: never;
        trace?: never;
    };
}
export type webhooks = Record<string, never>;
export interface components {
    schemas: {
        /** Problem details (RFC 9457) */
        Problem: {
            /**
             * Format: uri
             * @description leads to the page of this problem
             */
            type: string;
            title: string;
            status: number;
            detail: string;
            /** @description the request id, as a URN */
            instance: string;
            /** @enum {string} */
            code: "malformed_json" | "malformed_request" | "key_missing" | "key_invalid" | "key_expired" | "key_revoked" | "session_missing" | "session_ended" | "credentials_wrong" | "not_same_origin" | "role_missing" | "password_wrong" | "origin_not_allowed" | "server_key_in_browser" | "scope_missing" | "account_blocked" | "not_found" | "method_not_allowed" | "already_made" | "changed_meanwhile" | "too_much_saved" | "request_waiting" | "key_settled" | "too_many_keys" | "link_not_valid" | "too_large" | "unsupported_media_type" | "invalid_input" | "rate_limited" | "too_many_attempts" | "quota_exhausted" | "key_cap_reached" | "internal_error" | "unavailable";
            /** @description every fault of the input */
            errors?: {
                /** @description JSON Pointer into the body, or /name of a query field */
                pointer: string;
                code: string;
                /** @description what was given and what is allowed, in units */
                detail: string;
            }[];
        };
    };
    responses: {
        /** @description `malformed_json`, `malformed_request` */
        Problem400: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                RateLimit: components["headers"]["RateLimit"];
                "RateLimit-Policy": components["headers"]["RateLimit-Policy"];
                "Evenfall-Quota-Limit": components["headers"]["Evenfall-Quota-Limit"];
                "Evenfall-Quota-Remaining": components["headers"]["Evenfall-Quota-Remaining"];
                "Evenfall-Quota-Reset": components["headers"]["Evenfall-Quota-Reset"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `key_missing`, `key_invalid`, `key_expired`, `key_revoked`, `session_missing`, `session_ended`, `credentials_wrong` */
        Problem401: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                "WWW-Authenticate": components["headers"]["WWW-Authenticate"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `not_same_origin`, `role_missing`, `password_wrong`, `origin_not_allowed`, `server_key_in_browser`, `scope_missing`, `account_blocked` */
        Problem403: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                "WWW-Authenticate": components["headers"]["WWW-Authenticate"];
                RateLimit: components["headers"]["RateLimit"];
                "RateLimit-Policy": components["headers"]["RateLimit-Policy"];
                "Evenfall-Quota-Limit": components["headers"]["Evenfall-Quota-Limit"];
                "Evenfall-Quota-Remaining": components["headers"]["Evenfall-Quota-Remaining"];
                "Evenfall-Quota-Reset": components["headers"]["Evenfall-Quota-Reset"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `not_found` */
        Problem404: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `method_not_allowed` */
        Problem405: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                Allow: components["headers"]["Allow"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `already_made`, `changed_meanwhile`, `too_much_saved`, `request_waiting`, `key_settled`, `too_many_keys` */
        Problem409: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `link_not_valid` */
        Problem410: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `too_large` */
        Problem413: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                RateLimit: components["headers"]["RateLimit"];
                "RateLimit-Policy": components["headers"]["RateLimit-Policy"];
                "Evenfall-Quota-Limit": components["headers"]["Evenfall-Quota-Limit"];
                "Evenfall-Quota-Remaining": components["headers"]["Evenfall-Quota-Remaining"];
                "Evenfall-Quota-Reset": components["headers"]["Evenfall-Quota-Reset"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `unsupported_media_type` */
        Problem415: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                RateLimit: components["headers"]["RateLimit"];
                "RateLimit-Policy": components["headers"]["RateLimit-Policy"];
                "Evenfall-Quota-Limit": components["headers"]["Evenfall-Quota-Limit"];
                "Evenfall-Quota-Remaining": components["headers"]["Evenfall-Quota-Remaining"];
                "Evenfall-Quota-Reset": components["headers"]["Evenfall-Quota-Reset"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `invalid_input` */
        Problem422: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                RateLimit: components["headers"]["RateLimit"];
                "RateLimit-Policy": components["headers"]["RateLimit-Policy"];
                "Evenfall-Quota-Limit": components["headers"]["Evenfall-Quota-Limit"];
                "Evenfall-Quota-Remaining": components["headers"]["Evenfall-Quota-Remaining"];
                "Evenfall-Quota-Reset": components["headers"]["Evenfall-Quota-Reset"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `rate_limited`, `too_many_attempts`, `quota_exhausted`, `key_cap_reached` */
        Problem429: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                "Retry-After": components["headers"]["Retry-After"];
                RateLimit: components["headers"]["RateLimit"];
                "RateLimit-Policy": components["headers"]["RateLimit-Policy"];
                "Evenfall-Quota-Limit": components["headers"]["Evenfall-Quota-Limit"];
                "Evenfall-Quota-Remaining": components["headers"]["Evenfall-Quota-Remaining"];
                "Evenfall-Quota-Reset": components["headers"]["Evenfall-Quota-Reset"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `internal_error` */
        Problem500: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                RateLimit: components["headers"]["RateLimit"];
                "RateLimit-Policy": components["headers"]["RateLimit-Policy"];
                "Evenfall-Quota-Limit": components["headers"]["Evenfall-Quota-Limit"];
                "Evenfall-Quota-Remaining": components["headers"]["Evenfall-Quota-Remaining"];
                "Evenfall-Quota-Reset": components["headers"]["Evenfall-Quota-Reset"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
        /** @description `unavailable` */
        Problem503: {
            headers: {
                "X-Request-Id": components["headers"]["X-Request-Id"];
                "Retry-After": components["headers"]["Retry-After"];
                [name: string]: unknown;
            };
            content: {
                "application/problem+json": components["schemas"]["Problem"];
            };
        };
    };
    parameters: never;
    requestBodies: never;
    headers: {
        /** @description Names this call in logs and in messages to us */
        "X-Request-Id": string;
        /** @description What is left of the burst and of the month (IETF draft) */
        RateLimit: string;
        /** @description The burst’s and the month’s limits (IETF draft) */
        "RateLimit-Policy": string;
        /** @description Units of this calendar month (UTC) */
        "Evenfall-Quota-Limit": number;
        /** @description Units left */
        "Evenfall-Quota-Remaining": number;
        /** @description Seconds until the next month begins */
        "Evenfall-Quota-Reset": number;
        /** @description Seconds to wait */
        "Retry-After": number;
        /** @description Changes with the input and the engine’s version */
        ETag: string;
        /** @description How to authenticate */
        "WWW-Authenticate": string;
        /** @description The methods that this address takes */
        Allow: string;
        /** @description The session’s cookies; HttpOnly */
        "Set-Cookie": string;
        /** @description What the browser is to forget */
        "Clear-Site-Data": string;
        /** @description Where the thing is */
        Location: string;
        /** @description A name for the file */
        "Content-Disposition": string;
    };
    pathItems: never;
}
export type $defs = Record<string, never>;
export interface operations {
    SignUp: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /**
                     * E-mail address
                     * Format: email
                     */
                    email: string;
                    /** Name */
                    name: string;
                    /**
                     * Password
                     * Format: password
                     */
                    password: string;
                    /** Roles */
                    roles: ("developer" | "photographer" | "educator")[];
                };
            };
        };
        responses: {
            /** @description Ask for an account; a mail with a link to confirm the address goes out, whether or not it has one */
            202: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        sentTo: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ConfirmSignUp: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /** Token of the link */
                    token: string;
                };
            };
        };
        responses: {
            /** @description Open the account by the link that was mailed; signing in comes after */
            201: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        email: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            403: components["responses"]["Problem403"];
            410: components["responses"]["Problem410"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    SessionState: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Who is signed in; `stale`: refresh the session first */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        /** @enum {string} */
                        state: "none" | "stale" | "live";
                        account: {
                            /** Format: uuid */
                            id: string;
                            email: string;
                            name: string;
                            roles: ("developer" | "photographer" | "educator" | "admin")[];
                            /** @enum {string} */
                            lengthUnit: "metres" | "feet";
                        } | null;
                        accessEndsAt: string | null;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    SignIn: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /**
                     * E-mail address
                     * Format: email
                     */
                    email: string;
                    /**
                     * Password
                     * Format: password
                     */
                    password: string;
                };
            };
        };
        responses: {
            /** @description Sign in */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    "Set-Cookie": components["headers"]["Set-Cookie"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        account: {
                            /** Format: uuid */
                            id: string;
                            email: string;
                            name: string;
                            roles: ("developer" | "photographer" | "educator" | "admin")[];
                            /** @enum {string} */
                            lengthUnit: "metres" | "feet";
                        };
                        /** Format: date-time */
                        accessEndsAt: string;
                        /** Format: date-time */
                        sessionEndsAt: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    SignOut: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Sign out; also by an access token whose minutes are over */
            204: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    "Set-Cookie": components["headers"]["Set-Cookie"];
                    "Clear-Site-Data": components["headers"]["Clear-Site-Data"];
                    [name: string]: unknown;
                };
                content?: never;
            };
            400: components["responses"]["Problem400"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    RefreshSession: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Go on with the session; each refresh token is good for one use, and a second use ends the session */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    "Set-Cookie": components["headers"]["Set-Cookie"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        /** Format: date-time */
                        accessEndsAt: string;
                        /** Format: date-time */
                        sessionEndsAt: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    AskForPassword: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /**
                     * E-mail address
                     * Format: email
                     */
                    email: string;
                };
            };
        };
        responses: {
            /** @description Ask for a link to set a new password; a mail goes out, whether or not the address has an account */
            202: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        sentTo: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    SetPassword: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /** Token of the link */
                    token: string;
                    /**
                     * Password
                     * Format: password
                     */
                    password: string;
                };
            };
        };
        responses: {
            /** @description Set a new password by the link that was mailed; ends all sessions, and signs nobody in */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        email: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            403: components["responses"]["Problem403"];
            410: components["responses"]["Problem410"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    Me: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description The account, its plan, and how much of this month is used */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        account: {
                            /** Format: uuid */
                            id: string;
                            email: string;
                            name: string;
                            roles: ("developer" | "photographer" | "educator" | "admin")[];
                            /** @enum {string} */
                            lengthUnit: "metres" | "feet";
                        };
                        standing: {
                            plan: {
                                id: string;
                                title: string;
                                unitsPerMonth: number;
                                ratePerSecond: number;
                                burst: number;
                            };
                            quota: {
                                used: number;
                                limit: number;
                                remaining: number;
                                /** Format: date-time */
                                resetsAt: string;
                            };
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ChangeMe: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /** Name */
                    name?: string;
                    /**
                     * Units of measure
                     * @enum {string}
                     */
                    lengthUnit?: "metres" | "feet";
                };
            };
        };
        responses: {
            /** @description Change the name or the units of measure */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        account: {
                            /** Format: uuid */
                            id: string;
                            email: string;
                            name: string;
                            roles: ("developer" | "photographer" | "educator" | "admin")[];
                            /** @enum {string} */
                            lengthUnit: "metres" | "feet";
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    SetRoles: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /** Roles */
                    roles: ("developer" | "photographer" | "educator")[];
                };
            };
        };
        responses: {
            /** @description Choose the roles anew; admin is neither chosen nor lost here */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        account: {
                            /** Format: uuid */
                            id: string;
                            email: string;
                            name: string;
                            roles: ("developer" | "photographer" | "educator" | "admin")[];
                            /** @enum {string} */
                            lengthUnit: "metres" | "feet";
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ChangePassword: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /**
                     * Password
                     * Format: password
                     */
                    currentPassword: string;
                    /**
                     * Password
                     * Format: password
                     */
                    newPassword: string;
                };
            };
        };
        responses: {
            /** @description Change the password; ends the other sessions */
            204: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content?: never;
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ChangeEmail: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /**
                     * E-mail address
                     * Format: email
                     */
                    email: string;
                    /**
                     * Password
                     * Format: password
                     */
                    password: string;
                };
            };
        };
        responses: {
            /** @description Ask for another address; it holds when the link that is mailed there is used */
            202: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        sentTo: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ConfirmEmail: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /** Token of the link */
                    token: string;
                };
            };
        };
        responses: {
            /** @description Confirm a new address by the link that was mailed there */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        email: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            403: components["responses"]["Problem403"];
            410: components["responses"]["Problem410"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ExportData: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Everything that the service knows of the account, as a file */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    "Content-Disposition": components["headers"]["Content-Disposition"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        /** Format: date-time */
                        exportedAt: string;
                        account: {
                            /** Format: uuid */
                            id: string;
                            email: string;
                            name: string;
                            roles: ("developer" | "photographer" | "educator" | "admin")[];
                            /** @enum {string} */
                            lengthUnit: "metres" | "feet";
                        };
                        standing: {
                            plan: {
                                id: string;
                                title: string;
                                unitsPerMonth: number;
                                ratePerSecond: number;
                                burst: number;
                            };
                            quota: {
                                used: number;
                                limit: number;
                                remaining: number;
                                /** Format: date-time */
                                resetsAt: string;
                            };
                        };
                        usage: {
                            month: string;
                            units: number;
                        }[];
                        keys: {
                            /** Format: uuid */
                            id: string;
                            /** @enum {string} */
                            kind: "server" | "page";
                            name: string;
                            /**
                             * @description unclaimed: issued to you, not generated yet; replaced: rotated, working until its expiry
                             * @enum {string}
                             */
                            state: "unclaimed" | "live" | "replaced" | "expired" | "revoked";
                            /** @description its first characters; null until claimed */
                            shownPrefix: string | null;
                            lastFour: string | null;
                            scopes: string[];
                            monthlyCap: number | null;
                            usedThisMonth: number;
                            /** Format: date-time */
                            createdAt: string;
                            expiresAt: string | null;
                            lastUsedAt: string | null;
                            revokedAt: string | null;
                            replacedBy: string | null;
                        }[];
                        kit: {
                            [key: string]: unknown;
                        };
                        saved: {
                            /** Format: uuid */
                            id: string;
                            /**
                             * Kind
                             * @enum {string}
                             */
                            kind: "recipe" | "evening";
                            name: string;
                            version: number;
                            /** Format: date-time */
                            createdAt: string;
                            /** Format: date-time */
                            updatedAt: string;
                            /** @description where whoever has it may read the thing; null: not shared */
                            link: string | null;
                            body: {
                                [key: string]: unknown;
                            };
                        }[];
                        planRequests: {
                            /** Format: uuid */
                            id: string;
                            planId: string;
                            reason: string;
                            /** @enum {string} */
                            state: "open" | "granted" | "declined";
                            answer: string | null;
                            /** Format: date-time */
                            createdAt: string;
                            answeredAt: string | null;
                        }[];
                        sessions: {
                            /** Format: uuid */
                            id: string;
                            /** Format: date-time */
                            createdAt: string;
                            /** Format: date-time */
                            lastSeenAt: string;
                            /**
                             * Format: date-time
                             * @description however much it is used
                             */
                            endsAt: string;
                            /** @description what the browser calls itself */
                            agent: string;
                            address: string;
                            isThisOne: boolean;
                        }[];
                        events: {
                            id: string;
                            /** Format: date-time */
                            at: string;
                            event: string;
                            byYou: boolean;
                            subject: {
                                kind: string;
                                id: string;
                            } | null;
                            details: {
                                [key: string]: unknown;
                            };
                            address: string | null;
                            agent: string | null;
                        }[];
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ListEvents: {
        parameters: {
            query?: {
                before?: string;
            };
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description What happened to the account, the latest first, a page at a time */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        events: {
                            id: string;
                            /** Format: date-time */
                            at: string;
                            event: string;
                            byYou: boolean;
                            subject: {
                                kind: string;
                                id: string;
                            } | null;
                            details: {
                                [key: string]: unknown;
                            };
                            address: string | null;
                            agent: string | null;
                        }[];
                        next: string | null;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    CloseAccount: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /**
                     * Password
                     * Format: password
                     */
                    password: string;
                };
            };
        };
        responses: {
            /** @description Close the account for good: keys are revoked, what is personal is removed */
            204: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    "Set-Cookie": components["headers"]["Set-Cookie"];
                    "Clear-Site-Data": components["headers"]["Clear-Site-Data"];
                    [name: string]: unknown;
                };
                content?: never;
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ListSessions: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description The sessions that have not ended */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        sessions: {
                            /** Format: uuid */
                            id: string;
                            /** Format: date-time */
                            createdAt: string;
                            /** Format: date-time */
                            lastSeenAt: string;
                            /**
                             * Format: date-time
                             * @description however much it is used
                             */
                            endsAt: string;
                            /** @description what the browser calls itself */
                            agent: string;
                            address: string;
                            isThisOne: boolean;
                        }[];
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    EndOtherSessions: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description End all sessions but this one */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        ended: number;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    EndSession: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description End one session */
            204: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content?: never;
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ListKeys: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description The keys of the account, the newest first */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        keys: {
                            /** Format: uuid */
                            id: string;
                            /** @enum {string} */
                            kind: "server" | "page";
                            name: string;
                            /**
                             * @description unclaimed: issued to you, not generated yet; replaced: rotated, working until its expiry
                             * @enum {string}
                             */
                            state: "unclaimed" | "live" | "replaced" | "expired" | "revoked";
                            /** @description its first characters; null until claimed */
                            shownPrefix: string | null;
                            lastFour: string | null;
                            scopes: string[];
                            monthlyCap: number | null;
                            usedThisMonth: number;
                            /** Format: date-time */
                            createdAt: string;
                            expiresAt: string | null;
                            lastUsedAt: string | null;
                            revokedAt: string | null;
                            replacedBy: string | null;
                        }[];
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    MakeKey: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /** Name */
                    name: string;
                    /**
                     * Scopes
                     * @description "*" alone, or some of exposure, light, filters, flash, twilight, fill, frames, batch
                     * @default [
                     *       "*"
                     *     ]
                     */
                    scopes?: string[];
                    /**
                     * Monthly cap
                     * @description units; null: none
                     * @default null
                     */
                    monthlyCap?: number | null;
                    /**
                     * Expiry
                     * @description null: none
                     * @default null
                     */
                    expiresAt?: string | null;
                };
            };
        };
        responses: {
            /** @description Make a server key, shown whole in this answer alone; takes an Idempotency-Key */
            201: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    Location: components["headers"]["Location"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        key: {
                            /** Format: uuid */
                            id: string;
                            /** @enum {string} */
                            kind: "server" | "page";
                            name: string;
                            /**
                             * @description unclaimed: issued to you, not generated yet; replaced: rotated, working until its expiry
                             * @enum {string}
                             */
                            state: "unclaimed" | "live" | "replaced" | "expired" | "revoked";
                            /** @description its first characters; null until claimed */
                            shownPrefix: string | null;
                            lastFour: string | null;
                            scopes: string[];
                            monthlyCap: number | null;
                            usedThisMonth: number;
                            /** Format: date-time */
                            createdAt: string;
                            expiresAt: string | null;
                            lastUsedAt: string | null;
                            revokedAt: string | null;
                            replacedBy: string | null;
                        };
                        secret: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ReadKey: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description One key */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        key: {
                            /** Format: uuid */
                            id: string;
                            /** @enum {string} */
                            kind: "server" | "page";
                            name: string;
                            /**
                             * @description unclaimed: issued to you, not generated yet; replaced: rotated, working until its expiry
                             * @enum {string}
                             */
                            state: "unclaimed" | "live" | "replaced" | "expired" | "revoked";
                            /** @description its first characters; null until claimed */
                            shownPrefix: string | null;
                            lastFour: string | null;
                            scopes: string[];
                            monthlyCap: number | null;
                            usedThisMonth: number;
                            /** Format: date-time */
                            createdAt: string;
                            expiresAt: string | null;
                            lastUsedAt: string | null;
                            revokedAt: string | null;
                            replacedBy: string | null;
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ChangeKey: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /** Name */
                    name?: string;
                    /**
                     * Scopes
                     * @description "*" alone, or some of exposure, light, filters, flash, twilight, fill, frames, batch
                     */
                    scopes?: string[];
                    /**
                     * Monthly cap
                     * @description units; null: none
                     */
                    monthlyCap?: number | null;
                    /**
                     * Expiry
                     * @description null: none
                     */
                    expiresAt?: string | null;
                };
            };
        };
        responses: {
            /** @description Rename a key, or give it other scopes, another cap or another expiry */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        key: {
                            /** Format: uuid */
                            id: string;
                            /** @enum {string} */
                            kind: "server" | "page";
                            name: string;
                            /**
                             * @description unclaimed: issued to you, not generated yet; replaced: rotated, working until its expiry
                             * @enum {string}
                             */
                            state: "unclaimed" | "live" | "replaced" | "expired" | "revoked";
                            /** @description its first characters; null until claimed */
                            shownPrefix: string | null;
                            lastFour: string | null;
                            scopes: string[];
                            monthlyCap: number | null;
                            usedThisMonth: number;
                            /** Format: date-time */
                            createdAt: string;
                            expiresAt: string | null;
                            lastUsedAt: string | null;
                            revokedAt: string | null;
                            replacedBy: string | null;
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    RotateKey: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /**
                     * Grace
                     * @description how long the old key keeps working: at once, 1 h, 24 h, 7 d
                     * @default day
                     * @enum {string}
                     */
                    grace?: "none" | "hour" | "day" | "week";
                    /**
                     * Password
                     * Format: password
                     */
                    password?: string;
                };
            };
        };
        responses: {
            /** @description Make the key that takes another’s place; without grace the old one ends at once, and the password is asked for */
            201: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        key: {
                            /** Format: uuid */
                            id: string;
                            /** @enum {string} */
                            kind: "server" | "page";
                            name: string;
                            /**
                             * @description unclaimed: issued to you, not generated yet; replaced: rotated, working until its expiry
                             * @enum {string}
                             */
                            state: "unclaimed" | "live" | "replaced" | "expired" | "revoked";
                            /** @description its first characters; null until claimed */
                            shownPrefix: string | null;
                            lastFour: string | null;
                            scopes: string[];
                            monthlyCap: number | null;
                            usedThisMonth: number;
                            /** Format: date-time */
                            createdAt: string;
                            expiresAt: string | null;
                            lastUsedAt: string | null;
                            revokedAt: string | null;
                            replacedBy: string | null;
                        };
                        secret: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    RevokeKey: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": Record<string, never>;
            };
        };
        responses: {
            /** @description End a key for good; doing it again changes nothing */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        key: {
                            /** Format: uuid */
                            id: string;
                            /** @enum {string} */
                            kind: "server" | "page";
                            name: string;
                            /**
                             * @description unclaimed: issued to you, not generated yet; replaced: rotated, working until its expiry
                             * @enum {string}
                             */
                            state: "unclaimed" | "live" | "replaced" | "expired" | "revoked";
                            /** @description its first characters; null until claimed */
                            shownPrefix: string | null;
                            lastFour: string | null;
                            scopes: string[];
                            monthlyCap: number | null;
                            usedThisMonth: number;
                            /** Format: date-time */
                            createdAt: string;
                            expiresAt: string | null;
                            lastUsedAt: string | null;
                            revokedAt: string | null;
                            replacedBy: string | null;
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ClaimKey: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": Record<string, never>;
            };
        };
        responses: {
            /** @description Generate a key that an administrator issued to you: once, shown whole in this answer alone */
            201: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        key: {
                            /** Format: uuid */
                            id: string;
                            /** @enum {string} */
                            kind: "server" | "page";
                            name: string;
                            /**
                             * @description unclaimed: issued to you, not generated yet; replaced: rotated, working until its expiry
                             * @enum {string}
                             */
                            state: "unclaimed" | "live" | "replaced" | "expired" | "revoked";
                            /** @description its first characters; null until claimed */
                            shownPrefix: string | null;
                            lastFour: string | null;
                            scopes: string[];
                            monthlyCap: number | null;
                            usedThisMonth: number;
                            /** Format: date-time */
                            createdAt: string;
                            expiresAt: string | null;
                            lastUsedAt: string | null;
                            revokedAt: string | null;
                            replacedBy: string | null;
                        };
                        secret: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    GivePass: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": Record<string, never>;
            };
        };
        responses: {
            /** @description A bearer for the try page: ten minutes, from the console’s pages only, charged to this key */
            201: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        pass: string;
                        /** Format: date-time */
                        expiresAt: string;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ReadKeyLog: {
        parameters: {
            query?: {
                before?: string;
                status?: "2xx" | "3xx" | "4xx" | "5xx";
                calculator?: "exposure/value" | "exposure/solve" | "exposure/equivalents" | "exposure/difference" | "exposure/long" | "exposure/handheld" | "exposure/depth" | "light/convert" | "light/scenes" | "light/add" | "light/ratio" | "light/flicker" | "filters/density" | "filters/gel" | "flash/exposure" | "flash/measured" | "flash/falloff" | "flash/duration" | "flash/motion" | "flash/daylight" | "flash/budget" | "twilight/day" | "twilight/at" | "twilight/ladder" | "fill/recipes" | "fill/check" | "batch" | "usage";
            };
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description The recent calls of a key, the latest first, a page at a time */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        calls: {
                            /** Format: date-time */
                            at: string;
                            calculator: string;
                            status: number;
                            /** @description of the problem; null where there was none */
                            code: string | null;
                            units: number;
                            ms: number;
                            requestId: string;
                        }[];
                        next: string | null;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ReadUsage: {
        parameters: {
            query?: {
                from?: string;
                to?: string;
                keyId?: string;
            };
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Calls and units by day (UTC), calculator, key and class of status, and the month’s pace */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        /** Format: date */
                        from: string;
                        /** Format: date */
                        to: string;
                        total: {
                            calls: number;
                            units: number;
                            /** @description answered with 4xx */
                            refused: number;
                            /** @description answered with 5xx */
                            failed: number;
                            p50Ms: number | null;
                            p95Ms: number | null;
                        };
                        /** @description each day of the span */
                        days: {
                            /** Format: date */
                            day: string;
                            calls: number;
                            units: number;
                            /** @description answered with 4xx */
                            refused: number;
                            /** @description answered with 5xx */
                            failed: number;
                            p50Ms: number | null;
                            p95Ms: number | null;
                        }[];
                        calculators: {
                            calculator: string;
                            calls: number;
                            units: number;
                            /** @description answered with 4xx */
                            refused: number;
                            /** @description answered with 5xx */
                            failed: number;
                            p50Ms: number | null;
                            p95Ms: number | null;
                        }[];
                        keys: {
                            /** Format: uuid */
                            keyId: string;
                            name: string;
                            calls: number;
                            units: number;
                            /** @description answered with 4xx */
                            refused: number;
                            /** @description answered with 5xx */
                            failed: number;
                            p50Ms: number | null;
                            p95Ms: number | null;
                        }[];
                        statuses: {
                            statusClass: number;
                            calls: number;
                            units: number;
                            /** @description answered with 4xx */
                            refused: number;
                            /** @description answered with 5xx */
                            failed: number;
                            p50Ms: number | null;
                            p95Ms: number | null;
                        }[];
                        /** @description of this month and the whole account, whatever the span */
                        pace: {
                            used: number;
                            limit: number;
                            /** @description units at the month’s end if it goes on like this */
                            forecast: number;
                            runsOutAt: string | null;
                            /** Format: date-time */
                            resetsAt: string;
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ReadPlan: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description The plan, what is left of the month, the other plans, and what was asked for */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        standing: {
                            plan: {
                                id: string;
                                title: string;
                                unitsPerMonth: number;
                                ratePerSecond: number;
                                burst: number;
                            };
                            quota: {
                                used: number;
                                limit: number;
                                remaining: number;
                                /** Format: date-time */
                                resetsAt: string;
                            };
                        };
                        plans: {
                            id: string;
                            title: string;
                            unitsPerMonth: number;
                            ratePerSecond: number;
                            burst: number;
                        }[];
                        /** @description what was asked for, the latest first */
                        requests: {
                            /** Format: uuid */
                            id: string;
                            planId: string;
                            reason: string;
                            /** @enum {string} */
                            state: "open" | "granted" | "declined";
                            answer: string | null;
                            /** Format: date-time */
                            createdAt: string;
                            answeredAt: string | null;
                        }[];
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    AskForPlan: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /** Plan */
                    planId: string;
                    /** Reason */
                    reason: string;
                };
            };
        };
        responses: {
            /** @description Ask for another plan, with a reason; an administrator answers */
            201: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        standing: {
                            plan: {
                                id: string;
                                title: string;
                                unitsPerMonth: number;
                                ratePerSecond: number;
                                burst: number;
                            };
                            quota: {
                                used: number;
                                limit: number;
                                remaining: number;
                                /** Format: date-time */
                                resetsAt: string;
                            };
                        };
                        plans: {
                            id: string;
                            title: string;
                            unitsPerMonth: number;
                            ratePerSecond: number;
                            burst: number;
                        }[];
                        /** @description what was asked for, the latest first */
                        requests: {
                            /** Format: uuid */
                            id: string;
                            planId: string;
                            reason: string;
                            /** @enum {string} */
                            state: "open" | "granted" | "declined";
                            answer: string | null;
                            /** Format: date-time */
                            createdAt: string;
                            answeredAt: string | null;
                        }[];
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    WithdrawPlanRequest: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Take a wish back that has no answer yet */
            204: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content?: never;
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ReadKit: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description The gear of the account; version 0 where nothing was kept yet */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        kit: {
                            [key: string]: unknown;
                        };
                        version: number;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    KeepKit: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    kit: {
                        /**
                         * Cameras
                         * @default []
                         */
                        cameras?: {
                            /** Name */
                            name: string;
                            /** Sensor’s width */
                            sensorWidthMm: number;
                            /** Sensor’s height */
                            sensorHeightMm: number;
                            /** Pixels across */
                            pixelsAcross: number;
                            /**
                             * Lowest ISO
                             * @description ISO arithmetic speed
                             */
                            isoMin: number;
                            /**
                             * Highest ISO
                             * @description that you would use
                             */
                            isoMax: number;
                            /**
                             * Slowest shutter
                             * @description that you would use
                             */
                            shutterSlowest: number | string;
                            /**
                             * Fastest shutter
                             * @description exposure time, in seconds or as text such as "1/125" or "2s"
                             */
                            shutterFastest: number | string;
                            /**
                             * Sync speed
                             * @description exposure time, in seconds or as text such as "1/125" or "2s"
                             */
                            syncSpeed: number | string;
                            /** High-speed sync */
                            highSpeedSync?: {
                                /**
                                 * Curtain travel
                                 * @description of one curtain; the shorter of 1/300 s and the sync speed where left out
                                 */
                                curtainS?: number;
                                /**
                                 * Extra loss
                                 * @description what high-speed sync loses beyond the energy model, as measured; 0 where left out
                                 */
                                extraLossStops?: number;
                            };
                        }[];
                        /**
                         * Lenses
                         * @default []
                         */
                        lenses?: {
                            /** Name */
                            name: string;
                            /** Focal length */
                            focalLengthMm: number;
                            /**
                             * Longest focal length
                             * @description of a zoom
                             */
                            longestFocalLengthMm?: number;
                            /**
                             * Widest aperture
                             * @description f-number, as a number or as text such as "f/5.6"
                             */
                            apertureMin: number | string;
                            /**
                             * Smallest aperture
                             * @description f-number, as a number or as text such as "f/5.6"
                             */
                            apertureMax: number | string;
                        }[];
                        /**
                         * Flashes
                         * @default []
                         */
                        flashes?: ({
                            /** Name */
                            name: string;
                            /**
                             * Guide number
                             * @description f-number times metres at ISO 100 and full power, at the zoom or reflector in use; a list of guns adds as the root of the sum of squares
                             */
                            guideNumberM?: number | number[];
                            /**
                             * Energy
                             * @description of the capacitors, instead of a guide number
                             */
                            energyWs?: number;
                            /**
                             * Efficacy
                             * @description light for the energy; 15 to 50 as read for studio systems
                             */
                            efficacyLmSPerWs?: number;
                            /**
                             * Measured guide numbers
                             * @description with a modifier in place, from test frames
                             */
                            measured?: {
                                /** Modifier */
                                modifier: string;
                                /** Guide number */
                                guideNumberM: number;
                            }[];
                            /**
                             * Least power
                             * @description fraction of full power, above 0 up to 1, or text such as "1/16" or "1/16+1/3"
                             */
                            minPower: number | string;
                            /**
                             * Power step
                             * @description between two powers; 0.333 means a third
                             * @default 0.3333333333333333
                             */
                            powerStep?: number;
                            /**
                             * Duration t0.5
                             * @description at full power
                             */
                            t05S?: number;
                            /**
                             * Control of power
                             * @description decay: the whole capacitor empties, an exponential; cutoff: the tube is switched off early, so less power is shorter; voltage: the capacitor is charged less, so less power is longer
                             * @default decay
                             * @enum {string}
                             */
                            control?: "decay" | "cutoff" | "voltage";
                            /**
                             * Recycling
                             * @description after full power
                             */
                            recycleFullS?: number;
                        } & (unknown | unknown))[];
                        /**
                         * Modifiers
                         * @default []
                         */
                        modifiers?: {
                            /** Name */
                            name: string;
                            /**
                             * Loss
                             * @description as you measured it, with the flash that you use
                             */
                            lossStops: number;
                        }[];
                        /**
                         * Filters
                         * @default []
                         */
                        filters?: {
                            /** Name */
                            name: string;
                            /** Neutral density */
                            ndStops: number;
                        }[];
                        /**
                         * Batteries
                         * @default []
                         */
                        batteries?: {
                            /** Name */
                            name: string;
                            /**
                             * Pops at full power
                             * @description on one charge
                             */
                            fullPops: number;
                        }[];
                    };
                    /** Version that was changed */
                    version: number;
                };
            };
        };
        responses: {
            /** @description Keep the gear of the account, as changed from a version */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        kit: {
                            [key: string]: unknown;
                        };
                        version: number;
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ListSaved: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Saved recipes and evenings, the latest first */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        things: {
                            /** Format: uuid */
                            id: string;
                            /**
                             * Kind
                             * @enum {string}
                             */
                            kind: "recipe" | "evening";
                            name: string;
                            version: number;
                            /** Format: date-time */
                            createdAt: string;
                            /** Format: date-time */
                            updatedAt: string;
                            /** @description where whoever has it may read the thing; null: not shared */
                            link: string | null;
                        }[];
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    Save: {
        parameters: {
            query?: never;
            header?: never;
            path?: never;
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /**
                     * Kind
                     * @enum {string}
                     */
                    kind: "recipe" | "evening";
                    /** Name */
                    name: string;
                    /**
                     * Question
                     * @description as its calculator takes it
                     */
                    body: {
                        [key: string]: unknown;
                    };
                };
            };
        };
        responses: {
            /** @description Save a recipe’s or an evening’s question under a name */
            201: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    Location: components["headers"]["Location"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        thing: {
                            /** Format: uuid */
                            id: string;
                            /**
                             * Kind
                             * @enum {string}
                             */
                            kind: "recipe" | "evening";
                            name: string;
                            version: number;
                            /** Format: date-time */
                            createdAt: string;
                            /** Format: date-time */
                            updatedAt: string;
                            /** @description where whoever has it may read the thing; null: not shared */
                            link: string | null;
                            body: {
                                [key: string]: unknown;
                            };
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ReadSaved: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description One saved thing */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        thing: {
                            /** Format: uuid */
                            id: string;
                            /**
                             * Kind
                             * @enum {string}
                             */
                            kind: "recipe" | "evening";
                            name: string;
                            version: number;
                            /** Format: date-time */
                            createdAt: string;
                            /** Format: date-time */
                            updatedAt: string;
                            /** @description where whoever has it may read the thing; null: not shared */
                            link: string | null;
                            body: {
                                [key: string]: unknown;
                            };
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    DropSaved: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Remove a saved thing for good, and its link with it */
            204: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content?: never;
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ChangeSaved: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": {
                    /** Name */
                    name?: string;
                    /**
                     * Question
                     * @description as its calculator takes it
                     */
                    body?: {
                        [key: string]: unknown;
                    };
                    /** Version that was changed */
                    version: number;
                };
            };
        };
        responses: {
            /** @description Rename a saved thing, or put another question in its place, as changed from a version */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        thing: {
                            /** Format: uuid */
                            id: string;
                            /**
                             * Kind
                             * @enum {string}
                             */
                            kind: "recipe" | "evening";
                            name: string;
                            version: number;
                            /** Format: date-time */
                            createdAt: string;
                            /** Format: date-time */
                            updatedAt: string;
                            /** @description where whoever has it may read the thing; null: not shared */
                            link: string | null;
                            body: {
                                [key: string]: unknown;
                            };
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            409: components["responses"]["Problem409"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    Share: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody: {
            content: {
                "application/json": Record<string, never>;
            };
        };
        responses: {
            /** @description Let whoever has the link read this; asking again gives the same link */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        thing: {
                            /** Format: uuid */
                            id: string;
                            /**
                             * Kind
                             * @enum {string}
                             */
                            kind: "recipe" | "evening";
                            name: string;
                            version: number;
                            /** Format: date-time */
                            createdAt: string;
                            /** Format: date-time */
                            updatedAt: string;
                            /** @description where whoever has it may read the thing; null: not shared */
                            link: string | null;
                            body: {
                                [key: string]: unknown;
                            };
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    Unshare: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                id: string;
            };
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description Make the link worthless; a later one is another */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        thing: {
                            /** Format: uuid */
                            id: string;
                            /**
                             * Kind
                             * @enum {string}
                             */
                            kind: "recipe" | "evening";
                            name: string;
                            version: number;
                            /** Format: date-time */
                            createdAt: string;
                            /** Format: date-time */
                            updatedAt: string;
                            /** @description where whoever has it may read the thing; null: not shared */
                            link: string | null;
                            body: {
                                [key: string]: unknown;
                            };
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            401: components["responses"]["Problem401"];
            403: components["responses"]["Problem403"];
            404: components["responses"]["Problem404"];
            413: components["responses"]["Problem413"];
            415: components["responses"]["Problem415"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
    ReadShared: {
        parameters: {
            query?: never;
            header?: never;
            path: {
                token: string;
            };
            cookie?: never;
        };
        requestBody?: never;
        responses: {
            /** @description What stands behind a link, without whose it is */
            200: {
                headers: {
                    "X-Request-Id": components["headers"]["X-Request-Id"];
                    [name: string]: unknown;
                };
                content: {
                    "application/json": {
                        /**
                         * Kind
                         * @enum {string}
                         */
                        kind: "recipe" | "evening";
                        name: string;
                        /** Format: date-time */
                        updatedAt: string;
                        body: {
                            [key: string]: unknown;
                        };
                    };
                };
            };
            400: components["responses"]["Problem400"];
            404: components["responses"]["Problem404"];
            422: components["responses"]["Problem422"];
            429: components["responses"]["Problem429"];
            500: components["responses"]["Problem500"];
            503: components["responses"]["Problem503"];
        };
    };
}

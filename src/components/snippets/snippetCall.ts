/** A call as the snippets show it. */
export interface SnippetCall {
  /** Scheme and host, without a slash at the end. */
  readonly baseUrl: string;
  /** `group/name`. */
  readonly id: string;
  readonly body: unknown;
}

/** The name under which every snippet looks for the key, so that no key stands in code. */
export const KEY_VARIABLE = 'EVENFALL_KEY';

export const urlOf = ({ baseUrl, id }: SnippetCall): string => `${baseUrl}/v1/${id}`;

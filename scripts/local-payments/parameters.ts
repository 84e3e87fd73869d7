import { invalid } from './api-error';
import type { FormTree } from './form';

/** Reads the parameters of one call, and refuses what it does not know, as the real service does. */
export class Parameters {
  readonly #tree: FormTree;
  readonly #path: string;
  readonly #read = new Set<string>();
  readonly #children: Parameters[] = [];

  constructor(tree: FormTree, path = '') {
    this.#tree = tree;
    this.#path = path;
  }

  #name(name: string): string {
    return this.#path === '' ? name : `${this.#path}[${name}]`;
  }

  /** Whether it was sent, also when empty: empty unsets a value. */
  has(name: string): boolean {
    return name in this.#tree;
  }

  /** Null when not sent or empty. */
  text(name: string, limit = 5000): string | null {
    this.#read.add(name);
    const value = this.#tree[name];
    if (value === undefined || value === '') return null;
    if (typeof value !== 'string') throw invalid(`Invalid string: ${this.#name(name)}`, this.#name(name));
    if (value.length > limit) {
      throw invalid(
        `Invalid string: ${this.#name(name)} must be at most ${limit} characters`,
        this.#name(name),
      );
    }
    return value;
  }

  requiredText(name: string): string {
    const value = this.text(name);
    if (value === null) {
      throw invalid(`Missing required param: ${this.#name(name)}.`, this.#name(name), 'parameter_missing');
    }
    return value;
  }

  integer(name: string): number | null {
    const value = this.text(name);
    if (value === null) return null;
    const number = Number(value);
    if (!/^-?\d+$/.test(value) || !Number.isSafeInteger(number)) {
      throw invalid(`Invalid integer: ${value}`, this.#name(name), 'parameter_invalid_integer');
    }
    return number;
  }

  requiredInteger(name: string): number {
    this.requiredText(name);
    return this.integer(name) ?? 0;
  }

  flag(name: string): boolean | null {
    const value = this.text(name);
    if (value === null) return null;
    if (value === 'true' || value === 'false') return value === 'true';
    throw invalid(`Invalid boolean: ${value}`, this.#name(name));
  }

  oneOf<T extends string>(name: string, allowed: readonly T[]): T | null {
    const value = this.text(name);
    if (value === null) return null;
    const found = allowed.find((candidate) => candidate === value);
    if (found === undefined) {
      throw invalid(`Invalid ${this.#name(name)}: must be one of ${allowed.join(', ')}`, this.#name(name));
    }
    return found;
  }

  address(name: string): string | null {
    const value = this.text(name);
    if (value === null) return null;
    try {
      const { protocol } = new URL(value);
      if (protocol === 'http:' || protocol === 'https:') return value;
    } catch {
      // said below
    }
    throw invalid('Not a valid URL', this.#name(name), 'url_invalid');
  }

  email(name: string): string | null {
    const value = this.text(name, 512);
    if (value === null || /^[^\s@]+@[^\s@]+\.[^\s@]+$/.test(value)) return value;
    throw invalid(`Invalid email address: ${value}`, this.#name(name), 'email_invalid');
  }

  child(name: string): Parameters | null {
    this.#read.add(name);
    const value = this.#tree[name];
    if (value === undefined || value === '') return null;
    if (typeof value === 'string') throw invalid(`Invalid object: ${this.#name(name)}`, this.#name(name));
    const child = new Parameters(value, this.#name(name));
    this.#children.push(child);
    return child;
  }

  children(name: string): Parameters[] {
    const list = this.child(name);
    if (list === null) return [];
    const found = Object.keys(list.#tree).map((key) => list.child(key));
    return found.filter((child) => child !== null);
  }

  texts(name: string): string[] {
    const list = this.child(name);
    if (list === null) return [];
    return Object.keys(list.#tree).map((key) => list.text(key) ?? '');
  }

  /**
   * Puts what was sent over what is kept; an empty value removes its key, an empty `metadata` all.
   * Limits: 50 keys of at most 40 characters, values of at most 500.
   */
  metadata(kept: Record<string, string> = {}): Record<string, string> {
    this.#read.add('metadata');
    const sent = this.#tree.metadata;
    if (sent === undefined) return { ...kept };
    if (sent === '') return {};
    if (typeof sent === 'string') throw invalid('Invalid object', this.#name('metadata'));
    const result = new Map(Object.entries(kept));
    for (const [key, value] of Object.entries(sent)) {
      const param = `${this.#name('metadata')}[${key}]`;
      if (typeof value !== 'string') throw invalid('Metadata values must be strings', param);
      if (key.length > 40) throw invalid('Metadata keys must be at most 40 characters long', param);
      if (value.length > 500) throw invalid('Metadata values must be at most 500 characters long', param);
      if (value === '') result.delete(key);
      else result.set(key, value);
    }
    if (result.size > 50) throw invalid('Metadata can only have up to 50 keys', this.#name('metadata'));
    return Object.fromEntries(result);
  }

  /** @throws {ApiError} when something was sent that nobody read */
  finish(): void {
    const unknown = Object.keys(this.#tree).find((name) => !this.#read.has(name));
    if (unknown !== undefined) {
      const name = this.#name(unknown);
      throw invalid(`Received unknown parameter: ${name}`, name, 'parameter_unknown');
    }
    for (const child of this.#children) child.finish();
  }
}

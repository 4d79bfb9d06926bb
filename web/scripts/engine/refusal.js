/** Why a question has no answer: a code with parameters, for the page to put into words. */
export class EngineRefusal extends Error {
  /** @param {{code: string, parameters?: Record<string, any>, field?: string|null, line?: number|null}} refusal */
  constructor({ code, parameters = {}, field = null, line = null }) {
    super(code);
    this.code = code;
    this.parameters = parameters;
    this.field = field;
    this.line = line;
  }
}

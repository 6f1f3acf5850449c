/** Methods as the worker gives them: what takes time is answered later. */
export type Service<T> = {
  readonly [Name in keyof T]: T[Name] extends (...given: infer Given) => infer Answer
    ? (...given: Given) => Answer | Promise<Answer>
    : never;
};

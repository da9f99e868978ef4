type Reply = (url: string, init: RequestInit) => Promise<Response>;

/** As much of XMLHttpRequest as an upload needs, answered by the faked server; half of every upload goes first. */
export function uploadsBy(reply: Reply) {
  return class FakeUpload extends EventTarget {
    readonly upload = new EventTarget();
    status = 0;
    responseText = '';
    readonly #headers = new Headers();
    #url = '';
    #method = '';
    #type: string | null = null;

    open(method: string, url: string): void {
      this.#method = method;
      this.#url = url;
    }

    setRequestHeader(name: string, value: string): void {
      this.#headers.set(name, value);
    }

    getResponseHeader(): string | null {
      return this.#type;
    }

    send(body: FormData): void {
      void this.#carry(body);
    }

    async #carry(body: FormData): Promise<void> {
      this.upload.dispatchEvent(new ProgressEvent('progress', { lengthComputable: true, loaded: 1, total: 2 }));
      const answer = await reply(this.#url, { method: this.#method, headers: this.#headers, body });
      this.status = answer.status;
      this.#type = answer.headers.get('content-type');
      this.responseText = await answer.text();
      this.dispatchEvent(new ProgressEvent('load'));
    }
  };
}

import { Toast } from '@base-ui/react/toast';

const manager = Toast.createToastManager();

/**
 * Says what was just done, shortly, with a way back. `notify('Entry saved', { undo: () => … })`. Also `wrong: true` for an
 * action that failed. Errors of fields and pages never go here.
 */
export function notify(title: string, options: { undo?: () => void; detail?: string; wrong?: boolean } = {}): void {
  const { undo, detail, wrong = false } = options;
  manager.add({
    title,
    ...(detail ? { description: detail } : {}),
    type: wrong ? 'wrong' : 'done',
    priority: wrong ? 'high' : 'low',
    timeout: undo || wrong ? 10_000 : 5_000,
    ...(undo ? { actionProps: { children: 'Undo', onClick: undo } } : {}),
  });
}

/** Where notices appear; the frame places it once. */
export function Toasts() {
  return (
    <Toast.Provider toastManager={manager} limit={3}>
      <Toast.Portal>
        <Toast.Viewport className="no-print fixed inset-x-4 bottom-20 z-50 grid gap-2 sm:left-auto sm:w-[24rem] md:bottom-6">
          <ToastList />
        </Toast.Viewport>
      </Toast.Portal>
    </Toast.Provider>
  );
}

function ToastList() {
  const { toasts } = Toast.useToastManager();
  return toasts.map((toast) => (
    <Toast.Root key={toast.id} toast={toast} className="bg-ink text-sheet data-limited:hidden">
      <Toast.Content className="flex items-center gap-4 py-2 pr-2 pl-4">
        <div className="min-w-0 flex-1">
          <Toast.Title className="font-semibold">
            {toast.type === 'wrong' && 'Not done: '}
            {toast.title}
          </Toast.Title>
          <Toast.Description className="text-label" />
        </div>
        <Toast.Action className="min-h-9 px-3 font-semibold underline" />
        <Toast.Close className="grid size-9 place-items-center" aria-label="Close">
          ×
        </Toast.Close>
      </Toast.Content>
    </Toast.Root>
  ));
}

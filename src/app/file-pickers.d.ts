/** The pickers of the File System Access draft, which TypeScript's own library does not list yet. */
interface Window {
  showOpenFilePicker(options: FilePickerOptions): Promise<FileSystemFileHandle[]>;
  showSaveFilePicker(options: FilePickerOptions & { suggestedName?: string }): Promise<FileSystemFileHandle>;
}

interface FilePickerOptions {
  types: { description: string; accept: Record<string, `.${string}`[]> }[];
}

/** Files dragged over the window and dropped anywhere on it. */

import { useEffect, useState } from 'preact/hooks';

const bringsFiles = (event: DragEvent): boolean => event.dataTransfer?.types.includes('Files') ?? false;

/** True while files hang over the window; `take` gets those that are dropped. */
export function useDroppedFiles(take: (files: FileList) => void): boolean {
  const [isOver, setOver] = useState(false);
  useEffect(() => {
    const over = (event: DragEvent): void => {
      if (!bringsFiles(event)) return;
      event.preventDefault();
      setOver(true);
    };
    const leave = (event: DragEvent): void => {
      if (event.relatedTarget === null) setOver(false);
    };
    const drop = (event: DragEvent): void => {
      if (!bringsFiles(event)) return;
      event.preventDefault();
      setOver(false);
      take((event.dataTransfer as DataTransfer).files);
    };
    document.addEventListener('dragover', over);
    document.addEventListener('dragleave', leave);
    document.addEventListener('drop', drop);
    return () => {
      document.removeEventListener('dragover', over);
      document.removeEventListener('dragleave', leave);
      document.removeEventListener('drop', drop);
    };
  }, []);
  return isOver;
}

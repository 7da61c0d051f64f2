export interface Room {
  readonly room: string;
  readonly rooms: readonly string[];
  readonly packages: readonly string[] | 'any';
}
export const rooms: readonly Room[];
export const clientRooms: readonly string[];
export const pureRooms: readonly string[];
export function roomOf(file: string): Room | undefined;
export function mayImportFile(file: string, target: string): boolean;
export function mayImportPackage(file: string, name: string): boolean;
export function clientMayImport(target: string): boolean;

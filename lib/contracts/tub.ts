import { z } from 'zod';
import { contract } from './contract';
import { tubId } from './ids';

export const tubPurpose = z.enum(['adult', 'grower', 'hatchling', 'incubator', 'quarantine']);

export const listTubs = contract({
  id: 'tubs.list',
  method: 'GET',
  path: '/workspaces/{workspace}/tubs',
  summary: 'The tubs of the room by rack and place, and how many animals live in each',
  access: { scope: 'workspace', action: 'tub.see' },
  response: z.object({
    tubs: z.array(
      z.object({
        id: tubId,
        room: z.string(),
        rack: z.string(),
        label: z.string(),
        rowNumber: z.int(),
        columnNumber: z.int(),
        purpose: tubPurpose,
        animals: z.int(),
      }),
    ),
  }),
});

export const createTub = contract({
  id: 'tubs.create',
  method: 'POST',
  path: '/workspaces/{workspace}/tubs',
  summary: 'Add a tub to a rack',
  access: { scope: 'workspace', action: 'tub.edit' },
  body: z.object({
    room: z.string().trim().min(1, 'Name the room.').max(60),
    rack: z.string().trim().min(1, 'Name the rack.').max(60),
    label: z.string().trim().min(1, 'Give it a label.').max(20),
    rowNumber: z.int('A whole number.').min(1, 'Rows count from 1.').max(99),
    columnNumber: z.int('A whole number.').min(1, 'Columns count from 1.').max(99),
    purpose: tubPurpose.default('adult'),
  }),
  response: z.object({ id: tubId }),
});

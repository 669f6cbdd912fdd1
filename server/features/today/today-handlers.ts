import type { HandlersOf } from '../../api/handler';
import { readToday } from './today-service';

export const todayHandlers: HandlersOf<'today'> = { today: ({ tenant }) => readToday(tenant) };

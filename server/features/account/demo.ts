import { UserModel } from '@/server/db/models/UserModel';

/** Whether an account of the invented example is open: asked each time, as the demo can go at any moment. */
export const demoIsLoaded = async (): Promise<boolean> => (await UserModel.findOne({ where: { isDemo: true, status: 'active' }, attributes: ['id'], raw: true })) !== null;

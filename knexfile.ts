import { knexConfig } from './db/config';

export default knexConfig();

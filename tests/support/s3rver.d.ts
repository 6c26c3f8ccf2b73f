/** The part of the fake object store that the tests use; the package has no types of its own. */
declare module 's3rver' {
	export default class S3rver {
		constructor(options: {
			port: number;
			address: string;
			silent: boolean;
			directory: string;
			configureBuckets: { name: string; configs: string[] }[];
		});
		run(): Promise<{ address: string; port: number }>;
		close(): Promise<void>;
	}
}

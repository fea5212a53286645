import { decimalAmount } from '$lib/domain/shared/money';
import {
	blankEmbargo,
	blankLift,
	blankLoanEdit,
	blankMove,
	embargoInput,
	embargoLift,
	loanEdit,
	loanMoveInput
} from '$lib/schemas/partner';
import { guarded, valueOrError } from '$lib/server/http/guarded';
import { blankForm, readForm, refusedForm, refuseForm } from '$lib/server/http/read-form';
import { moveLoan } from '$lib/server/services/partners/move-loan';
import { readLoan } from '$lib/server/services/partners/read-loan';
import { editLoan } from '$lib/server/services/partners/save-loan';
import { liftEmbargo, setEmbargo } from '$lib/server/services/partners/set-embargo';
import type { PageServerLoadEvent, RequestEvent } from './$types';

export const load = guarded('loan.read', async ({ params }: PageServerLoadEvent, ctx) => {
	const read = valueOrError(await readLoan(ctx, Number(params.id)));
	const { version, dueOn, terms, disclosure, valueMinor, currency } = read.loan;
	const value = valueMinor !== null && currency ? decimalAmount(valueMinor, currency) : '';
	const [edit, move, embargo, lift] = await Promise.all([
		blankForm(
			loanEdit,
			{ version, dueOn: dueOn ?? '', terms, disclosure, value, currency: currency ?? '' },
			'edit'
		),
		blankForm(loanMoveInput, { ...blankMove, move: read.moves[0] ?? 'return', version }, 'move'),
		blankForm(
			embargoInput,
			{ ...blankEmbargo, sample: read.samples[0]?.slug ?? '', zone: read.zone },
			'embargo'
		),
		blankForm(embargoLift, blankLift, 'lift')
	]);
	return { title: `Loan from ${read.partnerName}`, ...read, edit, move, embargo, lift };
});

type Event = RequestEvent;
const loanId = (event: Event) => Number(event.params.id);

export const actions = {
	edit: guarded('loan.edit', async (event: Event, ctx) => {
		const { form, value } = await readForm(event.request, loanEdit, blankLoanEdit, 'edit');
		if (!value) return refuseForm(form);
		const edited = await editLoan(ctx, loanId(event), value);
		return edited.ok ? { form } : refusedForm(form, edited);
	}),
	move: guarded('loan.edit', async (event: Event, ctx) => {
		const { form, value } = await readForm(event.request, loanMoveInput, blankMove, 'move');
		if (!value) return refuseForm(form);
		const moved = await moveLoan(ctx, loanId(event), value);
		return moved.ok ? { form } : refusedForm(form, moved);
	}),
	embargo: guarded('loan.edit', async (event: Event, ctx) => {
		const { form, value } = await readForm(event.request, embargoInput, blankEmbargo, 'embargo');
		if (!value) return refuseForm(form);
		const set = await setEmbargo(ctx, loanId(event), value);
		return set.ok ? { form } : refusedForm(form, set);
	}),
	lift: guarded('loan.edit', async (event: Event, ctx) => {
		const { form, value } = await readForm(event.request, embargoLift, blankLift, 'lift');
		form.id = `lift-${form.data.embargo}`;
		if (!value) return refuseForm(form);
		const lifted = await liftEmbargo(ctx, loanId(event), value);
		return lifted.ok ? { form } : refusedForm(form, lifted);
	})
};

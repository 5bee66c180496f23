using System.Collections.Immutable;
using Bittern.Diagnostics.Codes;

namespace Bittern.Diagnostics;

/// <summary>Every code, in order. A test compares this list with the classes in <c>Codes</c>.</summary>
public static class DiagnosticCatalogue
{
    public static ImmutableArray<DiagnosticDescriptor> All { get; } =
    [
        TextNotClosed.Descriptor,
        DecimalComma.Descriptor,
        NumberTooLarge.Descriptor,
        StrangeCharacter.Descriptor,
        NestedTooDeep.Descriptor,
        StrayBrace.Descriptor,
        BlockNotClosed.Descriptor,
        Unexpected.Descriptor,
        UnknownDeclaration.Descriptor,
        NumberWithGap.Descriptor,
        ChargeOrder.Descriptor,
        ColonHydrate.Descriptor,
        NeedsBlock.Descriptor,
        NotAFormula.Descriptor,
        IonOrSolute.Descriptor,
        Unbalanced.Descriptor,
        UnknownSpecies.Descriptor,
        Cycle.Descriptor,
        DeclaredTwice.Descriptor,
        NeedsOverride.Descriptor,
        NothingToOverride.Descriptor,
        OverrideChangesReaction.Descriptor,
        OverrideWithoutReason.Descriptor,
        KspNotDissolution.Descriptor,
        ConstantNotPositive.Descriptor,
        PowerAsLog.Descriptor,
        UncertaintyOfPower.Descriptor,
        ExpressionWithEnthalpy.Descriptor,
        UnknownInExpression.Descriptor,
        HalfReactionWithoutElectrons.Descriptor,
        NoCitation.Descriptor,
        UnknownCitation.Descriptor,
        UnknownCatalogue.Descriptor,
        FileNotRead.Descriptor,
        OutOfRange.Descriptor,
        SetsDoNotMix.Descriptor,
        ModelAndSet.Descriptor,
        WrongUnit.Descriptor,
        OutOfBounds.Descriptor,
        AnalyteWithoutSpecies.Descriptor,
        CannotCountAs.Descriptor,
        AnalyteTwice.Descriptor,
        OfWhichDoesNotFit.Descriptor,
        CannotCloseCharge.Descriptor,
        UnitSuspected.Descriptor,
        UnknownGas.Descriptor,
        UnknownName.Descriptor,
        UnknownSolid.Descriptor,
        UnknownAction.Descriptor,
        UnknownQuantity.Descriptor,
        TrainWithoutFeed.Descriptor,
        DoseAsOther.Descriptor,
        FormedAndHeldBack.Descriptor,
        LimitByEquality.Descriptor,
        NoCouple.Descriptor,
        Unused.Descriptor,
        NoCertifiedAnswer.Descriptor,
        TargetUnreachable.Descriptor,
        ModelOutOfRange.Descriptor,
        AgentWithoutSource.Descriptor,
        SupersaturatedNotFormed.Descriptor,
    ];

    /// <summary>The descriptor of a code, in any case; null when there is no such code.</summary>
    public static DiagnosticDescriptor? Find(string id) =>
        All.FirstOrDefault(d => string.Equals(d.Id, id, StringComparison.OrdinalIgnoreCase));
}

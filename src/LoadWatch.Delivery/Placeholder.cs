namespace LoadWatch.Delivery.Internal; internal static class Placeholder { }

using System.Net.Security;
using System.Security.Authentication;
using System.Security.Cryptography.X509Certificates;
using MailKit.Net.Smtp;

namespace LoadWatch.Delivery.Mail;

/// <summary>
/// Which servers are believed: the host name must be in the certificate, and it must come from an authority that the machine trusts, or, where a file
/// names some, from one of those and no other. Nothing switches the check off.
/// </summary>
internal sealed class ServerTrust(string? authorityFile)
{
    /// <summary>What was wrong with the certificate, in plain words, or null.</summary>
    public string? Fault { get; private set; }

    /// <exception cref="IOException">The authorities' file cannot be read.</exception>
    /// <exception cref="System.Security.Cryptography.CryptographicException">It holds no certificate.</exception>
    public void Apply(SmtpClient client)
    {
        client.SslProtocols = SslProtocols.Tls12 | SslProtocols.Tls13;

        // A private authority publishes no list of what it revoked.
        client.CheckCertificateRevocation = authorityFile is null;
        var authorities = authorityFile is null ? null : Authorities(authorityFile);
        client.ServerCertificateValidationCallback = (_, certificate, chain, errors) =>
        {
            Fault = FaultOf(certificate as X509Certificate2, chain, errors, authorities);
            return Fault is null;
        };
    }

    /// <summary>The certificates of a PEM file.</summary>
    public static X509Certificate2Collection Authorities(string path)
    {
        var authorities = new X509Certificate2Collection();
        authorities.ImportFromPemFile(path);
        return authorities.Count > 0
            ? authorities
            : throw new System.Security.Cryptography.CryptographicException("the file holds no certificate in PEM form");
    }

    private static string? FaultOf(
        X509Certificate2? certificate, X509Chain? chain, SslPolicyErrors errors, X509Certificate2Collection? authorities)
    {
        if (certificate is null || errors.HasFlag(SslPolicyErrors.RemoteCertificateNotAvailable))
        {
            return "the server showed no certificate";
        }

        if (errors.HasFlag(SslPolicyErrors.RemoteCertificateNameMismatch))
        {
            return "the server's certificate is for another host name";
        }

        return authorities is null ? FaultOfChain(chain!, errors == SslPolicyErrors.None) : FaultUnder(authorities, certificate, chain);
    }

    private static string? FaultUnder(X509Certificate2Collection authorities, X509Certificate2 certificate, X509Chain? shown)
    {
        using var chain = new X509Chain();
        chain.ChainPolicy.TrustMode = X509ChainTrustMode.CustomRootTrust;
        chain.ChainPolicy.RevocationMode = X509RevocationMode.NoCheck;
        chain.ChainPolicy.CustomTrustStore.AddRange(authorities);

        // The purpose is asked for here as the ordinary check does: id-kp-serverAuth of RFC 5280, section 4.2.1.12.
        chain.ChainPolicy.ApplicationPolicy.Add(new System.Security.Cryptography.Oid("1.3.6.1.5.5.7.3.1"));
        foreach (var element in shown?.ChainElements ?? Enumerable.Empty<X509ChainElement>())
        {
            chain.ChainPolicy.ExtraStore.Add(element.Certificate);
        }

        return FaultOfChain(chain, chain.Build(certificate));
    }

    private static string? FaultOfChain(X509Chain chain, bool built)
    {
        if (built)
        {
            return null;
        }

        bool Has(X509ChainStatusFlags flag) => chain.ChainStatus.Any(one => one.Status.HasFlag(flag));
        return true switch
        {
            _ when Has(X509ChainStatusFlags.NotTimeValid) => "the server's certificate is out of date",
            _ when Has(X509ChainStatusFlags.Revoked) => "the server's certificate was revoked",
            // An authority of the same name but another key shows as a bad signature.
            _ when Has(X509ChainStatusFlags.UntrustedRoot) || Has(X509ChainStatusFlags.PartialChain) || Has(X509ChainStatusFlags.NotSignatureValid) =>
                "the server's certificate comes from no trusted authority",
            _ when Has(X509ChainStatusFlags.RevocationStatusUnknown) => "whether the server's certificate was revoked could not be found out",
            _ => "the server's certificate is not valid: " + string.Join(", ", chain.ChainStatus.Select(one => one.Status)),
        };
    }
}

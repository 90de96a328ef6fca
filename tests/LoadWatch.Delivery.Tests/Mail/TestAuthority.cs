using System.Security.Cryptography;
using System.Security.Cryptography.X509Certificates;

namespace LoadWatch.Delivery.Tests.Mail;

/// <summary>A certificate authority that lives as long as a test, and its certificate as a PEM file.</summary>
internal sealed class TestAuthority : IDisposable
{
    private const string ServerAuthentication = "1.3.6.1.5.5.7.3.1";

    private readonly DirectoryInfo temporary = Directory.CreateTempSubdirectory("loadwatch-authority-");
    private readonly X509Certificate2 root;

    public TestAuthority(string name = "Test authority")
    {
        using var key = ECDsa.Create(ECCurve.NamedCurves.nistP256);
        var request = Request($"CN={name}", key);
        request.CertificateExtensions.Add(new X509BasicConstraintsExtension(certificateAuthority: true, false, 0, critical: true));
        root = request.CreateSelfSigned(DateTimeOffset.UtcNow.AddDays(-30), DateTimeOffset.UtcNow.AddDays(30));
        File.WriteAllText(PemFile, root.ExportCertificatePem());
    }

    public string PemFile => Path.Combine(temporary.FullName, "authority.pem");

    /// <summary>A server certificate for one host name.</summary>
    public X509Certificate2 Issue(string host, int daysLeft = 10)
    {
        using var key = ECDsa.Create(ECCurve.NamedCurves.nistP256);
        var request = Request($"CN={host}", key);
        var names = new SubjectAlternativeNameBuilder();
        names.AddDnsName(host);
        request.CertificateExtensions.Add(names.Build());
        request.CertificateExtensions.Add(new X509EnhancedKeyUsageExtension([new Oid(ServerAuthentication)], critical: false));
        using var issued = request.Create(root, DateTimeOffset.UtcNow.AddDays(-20), DateTimeOffset.UtcNow.AddDays(daysLeft), [1, 2, 3, 4]);
        using var whole = issued.CopyWithPrivateKey(key);

        // The TLS of the platform wants the key in a store of its own.
        return X509CertificateLoader.LoadPkcs12(whole.Export(X509ContentType.Pkcs12), password: null);
    }

    public void Dispose()
    {
        root.Dispose();
        temporary.Delete(recursive: true);
    }

    private static CertificateRequest Request(string name, ECDsa key) => new(name, key, HashAlgorithmName.SHA256);
}
